import { join } from 'node:path';
import { ensureWebApp } from '../../scripts/web-export';
import { ensureTemplate } from './migrated-template';

/** Makes what every browser test needs: the migrated template, and the exported web app, whose folder is put in TEST_WEB_DIR. */
export default async function runningProduct(): Promise<void> {
  process.env.TEST_WEB_DIR = await ensureWebApp(join(__dirname, '..', '..'));
  await ensureTemplate();
}
