/**
 * Pieces that people build long passwords of and that guessers try first. Common practice, made for this product: words that stand
 * in for a secret, rows of a keyboard, the alphabet, the digits.
 */
const WORDS = [
  'password', 'passphrase', 'passwort', 'contrasena', 'letmein', 'welcome', 'iloveyou', 'secret', 'admin', 'login', 'changeme',
  'default', 'trustno', 'monkey', 'dragon', 'sunshine', 'princess', 'football', 'baseball', 'superman', 'batman', 'master',
  'correcthorsebatterystaple', 'tobeornottobe', 'thatisthequestion', 'thequickbrownfox', 'jumpsoverthelazydog', 'summer', 'winter',
  'spring', 'autumn', 'monday', 'friday', 'january', 'december', 'concrete', 'construction', 'footing', 'tallyrod', 'laser',
]; // prettier-ignore
const ROWS = [
  'abcdefghijklmnopqrstuvwxyz',
  '01234567890',
  'qwertyuiop',
  'asdfghjkl',
  'zxcvbnm',
  'qazwsxedcrfvtgb',
  '1q2w3e4r5t6y7u8i9o0p',
];

/** Shorter than this, a piece of a row is as likely chance as habit. */
const ROW_PIECE = 4;
/** What must be left when everything easily guessed is taken away. */
const LEAST_LEFT = 6;

/**
 * Whether a passphrase, however long, is made of what anybody would try: common words, rows of keys, the same thing again and
 * again, or the person's own name, company and address.
 * @param personal names and addresses of whoever chooses it
 */
export function isEasilyGuessed(passphrase: string, personal: readonly string[]): boolean {
  const plain = plainLetters(passphrase);
  if (new Set(plain).size < LEAST_LEFT) return true;
  const own = personal.flatMap((text) => text.split(/[^\p{L}\p{N}]+/u)).map(plainLetters);
  const pieces = [...WORDS, ...own].filter((piece) => piece.length >= 3).sort((a, b) => b.length - a.length);
  let left = plain;
  for (const piece of pieces) left = left.replaceAll(piece, ' ');
  left = withoutRows(left).replaceAll(/\d+/g, ' ').replaceAll(' ', '');
  return withoutRepeats(left).length < LEAST_LEFT;
}

function plainLetters(text: string): string {
  return text
    .normalize('NFKD')
    .toLowerCase()
    .replaceAll(/[^\p{L}\p{N}]/gu, '');
}

/** Takes away every piece of a row, forwards or backwards. */
function withoutRows(text: string): string {
  let left = text;
  for (const row of ROWS.flatMap((forwards) => [forwards, [...forwards].reverse().join('')])) {
    for (let size = row.length; size >= ROW_PIECE; size -= 1) {
      for (let from = 0; from + size <= row.length; from += 1) left = left.replaceAll(row.slice(from, from + size), ' ');
    }
  }
  return left;
}

/** `abcabcabc` says no more than `abc`. */
function withoutRepeats(text: string): string {
  return text.replaceAll(/(.+?)\1+/g, '$1');
}
