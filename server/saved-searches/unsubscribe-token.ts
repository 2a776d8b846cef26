import { createHmac } from 'node:crypto';
import { equalInConstantTime } from '../http/own-origin.ts';
import type { Config } from '../config.ts';

type Secrets = Pick<Config, 'sessionSecrets'>;

const ID_BYTES = 8;
/** 192 of the 256 bits: the whole is then 32 bytes, as the tokens of other links are. */
const MAC_BYTES = 24;

/** The purpose is signed with the id, so that no other signature of this secret fits here. */
function macOf(secret: string, id: Buffer): Buffer {
  return createHmac('sha256', secret)
    .update('unsubscribe from saved searches\0')
    .update(id)
    .digest()
    .subarray(0, MAC_BYTES);
}

function idBytes(memberId: number): Buffer {
  const bytes = Buffer.alloc(ID_BYTES);
  bytes.writeBigUInt64BE(BigInt(memberId));
  return bytes;
}

/**
 * Says whose mails about saved searches are to end, signed: 43 characters. Unlike the tokens of other
 * mails it is stored nowhere and stays valid, as an old mail must still be able to end the mails; all
 * it can do is that.
 */
export function unsubscribeToken({ sessionSecrets }: Secrets, memberId: number): string {
  const id = idBytes(memberId);
  return Buffer.concat([id, macOf(sessionSecrets[0], id)]).toString('base64url');
}

/** The member of a token, signed with any secret still in force; null when nobody signed it. */
export function memberOfUnsubscribeToken(
  { sessionSecrets }: Secrets,
  token: string,
): number | null {
  const bytes = Buffer.from(token, 'base64url');
  if (bytes.length !== ID_BYTES + MAC_BYTES) return null;
  const id = bytes.subarray(0, ID_BYTES);
  const given = bytes.subarray(ID_BYTES).toString('base64url');
  const isOurs = sessionSecrets.some((secret) =>
    equalInConstantTime(macOf(secret, id).toString('base64url'), given),
  );
  const memberId = Number(id.readBigUInt64BE());
  return isOurs && Number.isSafeInteger(memberId) ? memberId : null;
}
