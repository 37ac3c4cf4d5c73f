export interface StoredSeal {
  deskId: string;
  traderId: string;
  sequence: number | bigint;
  previousHash: string;
  hash: string;
  commitment: string;
  sealedAtMicroseconds: number | bigint;
  salt: string | null;
  payload: string | null;
}
export function verifyChain(seals: readonly StoredSeal[]): { sequence: number; finding: string }[];
