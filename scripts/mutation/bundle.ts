import { readFileSync } from 'node:fs';
import path from 'node:path';
import { type Plugin, build } from 'esbuild';
import type { Mutant } from './sites';

const root = path.resolve(__dirname, '../..');

/** The one changed file takes the place of the one on disk; `@/` is the root; a file's __dirname stays its own. */
function sourcesWith(mutant: Mutant | null): Plugin {
  return {
    name: 'sources',
    setup({ onResolve, onLoad }) {
      onResolve({ filter: /^@\// }, ({ path: asked, resolveDir }) => ({
        path: resolved(path.join(root, asked.slice(2)), resolveDir),
      }));
      onLoad({ filter: /\.ts$/ }, ({ path: file }) => {
        const source = readFileSync(file, 'utf8').replaceAll('__dirname', JSON.stringify(path.dirname(file)));
        const changed =
          mutant !== null && file === path.join(root, mutant.file)
            ? source.slice(0, mutant.start) + mutant.after + source.slice(mutant.end)
            : source;
        return { contents: changed, loader: 'ts' };
      });
    },
  };
}

function resolved(base: string, from: string): string {
  for (const candidate of [`${base}.ts`, path.join(base, 'index.ts')]) {
    try {
      readFileSync(candidate);
      return candidate;
    } catch (error) {
      if (!(error instanceof Error && 'code' in error && (error.code === 'ENOENT' || error.code === 'ENOTDIR'))) throw error;
    }
  }
  throw new Error(`${base}, asked for in ${from}, is no source file.`);
}

/** One test file with all it imports of the project, as a script for Node; and the project files that went into it. */
export async function bundle(test: string, mutant: Mutant | null): Promise<{ code: string; inputs: string[] }> {
  const result = await build({
    absWorkingDir: root,
    entryPoints: [test],
    bundle: true,
    write: false,
    metafile: true,
    platform: 'node',
    format: 'cjs',
    packages: 'external',
    logLevel: 'silent',
    plugins: [sourcesWith(mutant)],
  });
  return { code: result.outputFiles[0]?.text ?? '', inputs: Object.keys(result.metafile.inputs) };
}
