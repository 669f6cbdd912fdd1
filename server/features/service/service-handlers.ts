import { endpoints } from '@/shared/api/endpoints';
import type { HandlersOf } from '../../api/handler';
import { openApiDocument } from '../../api/openapi';
import type { Dependencies } from '../../dependencies';

/** Whether it runs, and what it can be asked. */
export function serviceHandlers({
  config,
  database,
}: Pick<Dependencies, 'config' | 'database'>): HandlersOf<'health' | 'openapi'> {
  const document = openApiDocument(endpoints, config.appUrl.origin);
  return {
    health: async () => {
      await database.ping();
      return { ok: true, database: 'answers' };
    },
    openapi: () => Promise.resolve(document),
  };
}
