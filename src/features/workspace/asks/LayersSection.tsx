import { Check } from "../../../components/choice";
import { PotentialScaleFields } from "../../../components/PotentialScale";
import { SectionHead } from "../../../components/text";
import { type LayerName, layerNames, type Layers, layerWords } from "../../../map/view";

/** What the map shows; remembered for the member, not for the plan. */
export function LayersSection({
  layers,
  onLayer,
  plain,
  onPlain,
}: {
  layers: Layers;
  onLayer: (name: LayerName, on: boolean) => void;
  plain: boolean;
  onPlain: (plain: boolean) => void;
}) {
  return (
    <section aria-label="On the map" className="mt-5">
      <SectionHead aside="remembered for you">On the map</SectionHead>
      <Check checked={plain} onChange={onPlain}>
        All fields, nothing hatched <span className="font-mono text-muted">f</span>
      </Check>
      {layerNames.map((name) => (
        <Check key={name} checked={layers[name]} onChange={(on) => onLayer(name, on)}>
          {layerWords[name]}
        </Check>
      ))}
      <PotentialScaleFields />
    </section>
  );
}
