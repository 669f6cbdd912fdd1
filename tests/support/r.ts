import { execFileSync } from 'node:child_process';

/**
 * Runs R's own code (Debian's r-base-core, with MASS from r-cran-mass) and gives the numbers it printed, one array a line of `cat`.
 * The script finds `emit(values)`, which prints 17 significant digits, enough to carry a double without loss. NA and NaN become null.
 */
export function runR(script: string): (number | null)[][] {
  const prelude = `emit <- function(v) cat(paste(ifelse(is.na(v), "NA", sprintf("%.17g", v)), collapse=" "), "\\n")\n`;
  const text = execFileSync('Rscript', ['--vanilla', '-'], {
    input: `${prelude}${script}\n`,
    encoding: 'utf8',
    maxBuffer: 1 << 28,
  });
  const lines = text.split('\n').filter((line) => line.trim() !== '');
  return lines.map((line) =>
    line
      .trim()
      .split(/\s+/)
      .map((word) => (word === 'NA' ? null : Number(word.replace(/^(-?)Inf$/, '$1Infinity')))),
  );
}

/** A vector as R reads it, every double to its last digit. */
export function rVector(values: readonly number[]): string {
  return `c(${values.map((value) => value.toPrecision(17)).join(',')})`;
}
