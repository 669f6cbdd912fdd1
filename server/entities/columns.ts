import type { EntitySchemaColumnOptions } from 'typeorm';

/** PostgreSQL's bigint travels as text, since it may be larger than a double holds; ours never is (ten kilometres are 1e13 nm). */
const wholeNumber = {
  to: (value: number | null | undefined) => value,
  from: (text: string | null) => (text === null ? null : Number(text)),
};

/** Half of every key: a row is its company's. */
export const companyId = { type: 'uuid', primary: true } as const satisfies EntitySchemaColumnOptions;
export const id = { type: 'uuid', primary: true } as const satisfies EntitySchemaColumnOptions;
export const uuid = { type: 'uuid' } as const satisfies EntitySchemaColumnOptions;
export const text = { type: 'text' } as const satisfies EntitySchemaColumnOptions;
export const integer = { type: 'integer' } as const satisfies EntitySchemaColumnOptions;
/** Whole nanometres, or milliseconds since 1970. */
export const big = { type: 'bigint', transformer: wholeNumber } satisfies EntitySchemaColumnOptions;
export const double = { type: 'double precision' } as const satisfies EntitySchemaColumnOptions;
export const flag = { type: 'boolean' } as const satisfies EntitySchemaColumnOptions;
export const time = { type: 'timestamptz' } as const satisfies EntitySchemaColumnOptions;
