import { hash, verify } from '@node-rs/argon2';

/** Argon2id (the library's kind unless told otherwise), 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** `salt`: 16 bytes of chance. */
export function hashPassphrase(passphrase: string, salt: Uint8Array): Promise<string> {
  return hash(passphrase.normalize('NFC'), { ...COST, salt });
}

/** `known` null: nobody has the address. It then takes as long to say no as it takes to say no to a wrong passphrase. */
export async function isPassphrase(passphrase: string, known: string | null): Promise<boolean> {
  const matches = await verify(known ?? (await nobodysHash()), passphrase.normalize('NFC'));
  return known !== null && matches;
}

let hashOfNobody: Promise<string> | undefined;
function nobodysHash(): Promise<string> {
  hashOfNobody ??= hashPassphrase('the passphrase of nobody at all', new Uint8Array(16));
  return hashOfNobody;
}
