import { describe, expect, test } from "vitest";
import {
  differenceSentences,
  feedStrips,
  percentAxis,
  windowSentences,
} from "../../../src/features/campaigns/compareModel";
import type { PlacedTrial } from "../../../src/lib/judgedTrials";

let made = 0;
function trial(
  campaignId: string,
  feedId: string,
  recoveryPct: number | null,
  part: Partial<Pick<PlacedTrial, "count" | "stage">> & { gangue?: number } = {},
): PlacedTrial {
  const { gangue = 1, count = "inside", stage = "NL" } = part;
  made += 1;
  return {
    id: `t${made}`,
    code: `T-${made}`,
    campaignId,
    campaignCode: campaignId,
    feedId,
    feedName: `feed ${feedId}`,
    stage,
    count,
    figures: { recoveryPct, gangueDissolvedPct: gangue, selectivityPct: null, temperatureC: 60 },
  } as unknown as PlacedTrial;
}
const campaigns = [
  { id: "A", code: "A" },
  { id: "B", code: "B" },
];
const words = { what: "Zn extraction", left: "A", right: "B" };

describe("campaigns side by side", () => {
  test("a strip holds the trials of one campaign on one feed; rejected ones and other stages are left out", () => {
    const strips = feedStrips(
      [trial("A", "1", 80), trial("A", "1", 90), trial("A", "1", null), trial("A", "1", 5, { count: "rejected" }), trial("A", "1", 1, { stage: "WA" })],
      campaigns,
      "NL",
      "recoveryPct",
    ); // prettier-ignore
    expect(strips).toHaveLength(1);
    expect(strips[0]?.strips[0]).toMatchObject({ without: 1, spread: { n: 2, mean: 85, min: 80, max: 90 } });
    expect(strips[0]?.strips[1]).toMatchObject({ dots: [], spread: null });
  });

  test("within one feed the difference is said at once", () => {
    const feeds = feedStrips([trial("A", "1", 80), trial("B", "1", 84)], campaigns, "NL", "recoveryPct");
    const { verdict, byFeed } = differenceSentences(words, feeds);
    expect(verdict).toContain("B gave 4.0 points more Zn extraction than A, on the same feed");
    expect(byFeed).toEqual([]);
  });

  test("where the feeds pull apart, feed by feed contradicts the whole, and both are said", () => {
    // A ran mostly the rich feed, B mostly the poor one: B is better on each and worse over all.
    const trials = [
      ...[90, 90, 90, 60].map((r, i) => trial("A", i < 3 ? "rich" : "poor", r)),
      ...[92, 64, 64, 64].map((r, i) => trial("B", i < 1 ? "rich" : "poor", r)),
    ];
    const { verdict, byFeed } = differenceSentences(words, feedStrips(trials, campaigns, "NL", "recoveryPct"));
    expect(verdict).toContain("11.5 points less Zn extraction than A over all feeds");
    expect(verdict).toContain("Compare within a feed");
    expect(byFeed.map((s) => s.split(",")[0])).toEqual(["feed poor: 4.0 points more", "feed rich: 2.0 points more"]);
  });

  test("without a common feed the difference is not pinned on the campaign", () => {
    const feeds = feedStrips([trial("A", "1", 80), trial("B", "2", 84)], campaigns, "NL", "recoveryPct");
    expect(differenceSentences(words, feeds).verdict).toContain("no feed was run in both");
  });

  test("nothing to compare is said, not counted as zero", () => {
    const feeds = feedStrips([trial("A", "1", null), trial("B", "1", 84)], campaigns, "NL", "recoveryPct");
    expect(differenceSentences(words, feeds).verdict).toBe(
      "A has no Zn extraction yet, so there is nothing to compare.",
    );
  });

  test("inside against outside with n, and poor trials inside by name", () => {
    const stage = { code: "NL", target: "Zn", gangue: "Fe" };
    const trials = [trial("A", "1", 90, { gangue: 0.4 }), trial("A", "1", 60, { gangue: 0.2 }), trial("B", "1", 88, { gangue: 11, count: "outside" })]; // prettier-ignore
    const [iron, zinc, poor] = windowSentences(trials, stage);
    expect(iron).toMatch(/^Fe: inside 0\.3.% dissolved \(n 2, 0\.2 to 0\.4\), outside 11\.0.% dissolved \(n 1/);
    expect(zinc).toMatch(/^Zn: inside 75.% recovered \(n 2/);
    expect(poor).toContain(`One trial inside stayed below 70 % Zn (${trials[1]?.code})`);
    expect(windowSentences([trials[0]!], stage)[0]).toContain("one side only");
  });

  test("an axis is round, holds its dots, and stays within 0 to 100 unless a dot does not", () => {
    expect(percentAxis([71, 88])).toMatchObject({ lo: 70, hi: 90 });
    expect(percentAxis([1, 99.9])).toMatchObject({ lo: 0, hi: 100 });
    expect(percentAxis([-4, 103]).lo).toBeLessThan(-4);
    expect(percentAxis([-4, 103]).hi).toBeGreaterThan(103);
    expect(percentAxis([]).ticks.length).toBeGreaterThan(1);
  });
});
