import type { ThemeColours } from "../../lib/theme";
import type { ProposedMark } from "../proposalStore";
import { plainText } from "../speciesText";
import { SvgText } from "./SvgText";

interface ProposalMarksProps {
  marks: readonly ProposedMark[];
  toPixel: (pH: number, Eh: number) => [number, number];
  colours: Pick<ThemeColours, "sheet" | "verdigris">;
}

/** Proposed conditions for a picture that travels: numbered plates. On the screen they lie over the map (ProposalsLayer.tsx). */
export function ProposalMarks({ marks, toPixel, colours }: ProposalMarksProps) {
  return marks.map(({ n, pH, Eh }) => {
    const [x, y] = toPixel(pH, Eh);
    return (
      <g key={n} data-proposed={n}>
        <rect
          x={x - 9}
          y={y - 9}
          width={18}
          height={18}
          fill={colours.sheet}
          stroke={colours.verdigris}
          strokeWidth={2}
        />
        <SvgText
          lines={[{ parts: plainText(String(n)), size: 11, bold: true }]}
          x={x}
          y={y}
          colour={colours.verdigris}
        />
      </g>
    );
  });
}
