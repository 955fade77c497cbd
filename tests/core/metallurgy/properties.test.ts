import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { closeAccount } from "../../../shared/metallurgy/closure";
import {
  dissolvedAtEachSample,
  dissolvedMetal,
  volumeLeft,
  type Vessel,
} from "../../../shared/metallurgy/dissolvedMetal";
import {
  accountability,
  extractionByResidue,
  extractionBySolution,
  extractionOnCalculatedHead,
} from "../../../shared/metallurgy/extraction";
import {
  calculatedHeadError,
  residueError,
  solutionError,
  usualErrors,
} from "../../../shared/metallurgy/recoveryError";
import { pulpOf, solidsByMass } from "../../../shared/metallurgy/pulp";
import { metalAccount } from "../../../shared/metallurgy/account/metalAccount";
import { chemistry } from "../../support/chemistry";
import { assays, exampleFeed, exampleRecord, exampleSamples, trialOf } from "../../support/trials";

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const withdrawal = fc.record({
  volume: number(0.001, 0.02),
  assay: number(0, 50),
  makeUpVolume: number(0, 0.02),
  makeUpAssay: number(0, 5),
});
const vessels = fc.record({
  volume: number(0.5, 5),
  assay: number(0, 10),
  withdrawals: fc.array(withdrawal, { maxLength: 8 }),
});
const near = (a: number, b: number): void => {
  expect(Math.abs(a - b)).toBeLessThanOrEqual(1e-9 * (1 + Math.abs(b)));
};

/** Slow plain twin: what the vessel holds step by step, dM_n = V_n c_n - [(V_(n-1) - v) c_(n-1) + u c_m]. */
function stepByStep({ volume, assay, withdrawals }: Vessel, final: number): number {
  let [V, held, dissolved] = [volume, volume * assay, 0];
  for (const w of withdrawals) {
    dissolved += V * w.assay - held;
    V += w.makeUpVolume - w.volume;
    held = (V - w.makeUpVolume) * w.assay + w.makeUpVolume * w.makeUpAssay;
  }
  return dissolved + V * final - held;
}

describe("dissolved metal", () => {
  test("is the sum of the steps between samples", () => {
    fc.assert(
      fc.property(vessels, number(0, 50), (v, final) =>
        near(dissolvedMetal(v, volumeLeft(v), final), stepByStep(v, final)),
      ),
    );
  });
  test("does not change where a sample is taken and put back whole", () => {
    fc.assert(
      fc.property(vessels, number(0, 50), number(0.001, 0.02), (v, final, volume) => {
        const more = { volume, assay: final, makeUpVolume: volume, makeUpAssay: final };
        near(
          dissolvedMetal({ ...v, withdrawals: [...v.withdrawals, more] }, volumeLeft(v), final),
          dissolvedMetal(v, volumeLeft(v), final),
        );
      }),
    );
  });
  test("at each sample is what the trial would have given had it ended there", () => {
    fc.assert(
      fc.property(vessels, (v) => {
        dissolvedAtEachSample(v).forEach((at, i) => {
          const cut = { ...v, withdrawals: v.withdrawals.slice(0, i) };
          near(at, stepByStep(cut, v.withdrawals[i]!.assay));
        });
      }),
    );
  });
});

describe("closure", () => {
  const weighed = fc.record({ value: number(0.1, 100), s: number(0.001, 5) });
  test("the adjusted masses balance, and one that is sure stays", () => {
    fc.assert(
      fc.property(weighed, weighed, weighed, (F, S, T) => {
        const c = closeAccount(F, S, T);
        near(c.feed, c.solution + c.residue);
        near(closeAccount({ ...F, s: 0 }, S, T).feed, F.value);
      }),
    );
  });
  test("nothing else that balances lies nearer in weighted squares", () => {
    fc.assert(
      fc.property(weighed, weighed, weighed, number(-1, 1), number(-1, 1), (F, S, T, a, b) => {
        const c = closeAccount(F, S, T);
        const cost = (f: number, s: number, t: number) =>
          ((f - F.value) / F.s) ** 2 + ((s - S.value) / S.s) ** 2 + ((t - T.value) / T.s) ** 2;
        const least = cost(c.feed, c.solution, c.residue);
        expect(cost(c.feed + a + b, c.solution + a, c.residue + b)).toBeGreaterThanOrEqual(least * (1 - 1e-9) - 1e-9);
      }),
    );
  });
});

test("the three recoveries agree where the account closes", () => {
  fc.assert(
    fc.property(number(0.01, 10), number(0.01, 10), (M, T) => {
      near(accountability(M, T, M + T), 100);
      near(extractionByResidue(T, M + T), extractionBySolution(M, M + T));
      near(extractionOnCalculatedHead(M, T), extractionBySolution(M, M + T));
    }),
  );
});

test("solids by mass and by volume are each other's inverse", () => {
  fc.assert(
    fc.property(number(0.05, 0.7), number(2, 6), number(0.95, 1.4), (S, rs, rl) =>
      near(solidsByMass(pulpOf(S, rs, rl).solidsPerLitre / 1000, rs, rl), S),
    ),
  );
});

test("first-order errors are those of drawing every number (20 000 draws, seeded)", () => {
  let state = 7;
  const uniform = () => ((state = (state * 1103515245 + 12345) % 2147483648) + 0.5) / 2147483648;
  const draw = (mean: number, r: number) =>
    mean * (1 + r * Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform()));
  const e = usualErrors;
  const spread = (f: () => number) => {
    const x = Array.from({ length: 20_000 }, f);
    const mean = x.reduce((a, b) => a + b) / x.length;
    return Math.sqrt(x.reduce((a, b) => a + (b - mean) ** 2, 0) / (x.length - 1));
  };
  const S = () => draw(draw(3.2728, e.volume), e.solutionAssay);
  const T = () => draw(draw(0.5211, e.residueMass), e.residueAssay);
  const F = () => draw(draw(3.8, e.feedMass), e.head);
  expect(spread(() => extractionByResidue(T(), F())) / residueError(86.29, e)).toBeCloseTo(1, 1);
  expect(spread(() => extractionBySolution(S(), F())) / solutionError(86.13, e)).toBeCloseTo(1, 1);
  expect(spread(() => extractionOnCalculatedHead(S(), T())) / calculatedHeadError(86.26, e)).toBeCloseTo(1, 1);
});

test("the interval of a censored account holds every account its values allow, and its ends are reached", () => {
  const record = exampleRecord();
  const masses = chemistry().molarMass;
  const with_ = (first: string, residue: string) => {
    const samples = exampleSamples("10 mL").map((s, i) => (i === 0 ? { ...s, assays: assays({ Cu: first }) } : s));
    const products = { ...record.products, residueAssays: assays({ Cu: residue }) };
    return metalAccount(trialOf({ ...record, samples, products }), exampleFeed, "Cu", masses);
  };
  const censored = with_("<1.9 g/L", "<0.05 %");
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 1900 }), fc.integer({ min: 0, max: 500 }), (first, residue) => {
      const one = with_(`${first} mg/L`, `${residue / 1e4} %`);
      one.bases.forEach(({ value }, i) => {
        const { lo, hi } = censored.bases[i]!.value!;
        expect(value!.lo).toBeGreaterThanOrEqual(lo - 1e-9);
        expect(value!.hi).toBeLessThanOrEqual(hi + 1e-9);
      });
    }),
    { numRuns: 40 },
  );
  near(with_("0 g/L", "0.05 %").bases[0]!.value!.lo, censored.bases[0]!.value!.lo);
  near(with_("1.9 g/L", "0 %").bases[0]!.value!.hi, censored.bases[0]!.value!.hi);
});
