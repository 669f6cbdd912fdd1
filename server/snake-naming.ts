import { DefaultNamingStrategy } from 'typeorm';

/** Columns as SQL writes them: `companyId` in code is `company_id` in a table. TypeORM's own strategy does this for tables only. */
export class SnakeNaming extends DefaultNamingStrategy {
  override columnName(propertyName: string, customName: string | undefined, embeddedPrefixes: string[]): string {
    const name = customName ?? propertyName;
    return [...embeddedPrefixes, name].join('_').replaceAll(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
  }
}
