import { scientificParts, THIN_SPACE } from "../lib/format";

/** A number in prose: plain where it is readable, else 8.0×10⁻² with a true superscript; unit after a thin space. */
export function Quantity({ value, figures = 2, unit }: { value: number; figures?: number; unit?: string }) {
  const { sign, mantissa, exponent } = scientificParts(value, figures);
  return (
    <span className="font-mono whitespace-nowrap">
      {sign}
      {mantissa}
      {exponent !== null && (
        <>
          ×10<sup>{exponent}</sup>
        </>
      )}
      {unit && `${THIN_SPACE}${unit}`}
    </span>
  );
}
