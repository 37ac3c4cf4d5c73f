import fc from 'fast-check';
import { toCanonicalText } from '@/server/seals/canonical-text';
import { commitmentOf, firstPreviousHash, sealHash } from '@/server/seals/seal-hash';
import { verifyChain } from '@/scripts/verify-chain.mjs';

const deskId = '01940000-0000-7000-8000-000000000001';
const traderId = '01940000-0000-7000-8000-000000000002';

function makeChain(length: number) {
  let previousHash = firstPreviousHash;
  return Array.from({ length }, (_, index) => {
    const sequence = index + 1;
    const salt = sequence.toString(16).padStart(32, '0');
    const payload = toCanonicalText({ idea: `Plan ${sequence}`, strike: 97 + sequence, odds: 1 / sequence });
    const commitment = commitmentOf(salt, payload);
    const sealedAtMicroseconds = 1_796_850_000_000_000n + BigInt(sequence) * 60_000_000n;
    const hash = sealHash({ deskId, traderId, sequence, previousHash, sealedAtMicroseconds }, commitment);
    const seal = { deskId, traderId, sequence, previousHash, hash, commitment, sealedAtMicroseconds, salt, payload };
    previousHash = hash;
    return seal;
  });
}
type Chain = ReturnType<typeof makeChain>;

describe('sealHash', () => {
  // Fixed for ever: a change here would make every stored chain unverifiable. Made by a script in another language
  // (Python 3.11, hashlib and json) from the construction written above `sealHash`.
  it('gives the golden hashes of version 1', () => {
    expect(makeChain(3).map((seal) => seal.hash)).toEqual([
      'd6f0f267e6cf4e45acdbde7bc05f989ae8261cd3cedcb97a1b79c8e4b9efa935',
      'f390697f6829ade9aecf0f85f77fd50877591aa4836b3f78305047044dee28f1',
      '1159ff1cb4e166f814a18bdc957596684bf855099972d28a91a0f16c04462e4c',
    ]);
  });
});

describe('the independent verifier', () => {
  it('finds nothing in an honest chain', () => {
    expect(verifyChain(makeChain(40))).toEqual([]);
  });

  it('accepts a chain whose contents were erased, because the commitments stay', () => {
    expect(verifyChain(makeChain(5).map((seal) => ({ ...seal, salt: null, payload: null })))).toEqual([]);
  });

  const honest = makeChain(30);
  const edits: Record<string, (chain: Chain, at: number, other: number) => Chain> = {
    'an edited content': (chain, at) => edit(chain, at, { payload: chain[at]?.payload.replace('Plan', 'plan') }),
    'a moved time': (chain, at) =>
      edit(chain, at, { sealedAtMicroseconds: (chain[at]?.sealedAtMicroseconds ?? 0n) + 1n }),
    'another trader': (chain, at) => edit(chain, at, { traderId: deskId }),
    'another commitment': (chain, at) => edit(chain, at, { commitment: commitmentOf('00', 'x') }),
    'a deletion': (chain, at) => chain.filter((_, index) => index !== at),
    'a repetition': (chain, at) => chain.flatMap((seal, index) => (index === at ? [seal, seal] : [seal])),
    'a swap': (chain, at, other) =>
      chain.map((seal, index) => (index === at ? chain[other] : index === other ? chain[at] : seal) ?? seal),
  };

  it.each(Object.entries(edits))('finds %s at the right place', (_, change) => {
    const place = fc.integer({ min: 0, max: honest.length - 2 });
    fc.assert(
      fc.property(place, place, (one, two) => {
        const at = Math.min(one, two);
        const other = Math.max(one, two) + 1;
        const [first] = verifyChain(change(honest, at, other));
        expect(first?.sequence).toBeGreaterThanOrEqual(at + 1);
        expect(first?.sequence).toBeLessThanOrEqual(at === other ? at + 1 : other + 1);
      }),
      { seed: 20261201, numRuns: 150 },
    );
  });
});

function edit(chain: Chain, at: number, change: Partial<Chain[number]>): Chain {
  return chain.map((seal, index) => (index === at ? { ...seal, ...change } : seal));
}
