import { useState } from "react";
import { Check } from "../../../components/choice";
import { Button } from "../../../components/Button";
import { PotentialScaleDialog } from "../../../components/PotentialScaleDialog";
import { Term } from "../../../components/Help";
import { Row, SectionHead } from "../../../components/text";
import { type LayerName, layerNames, type Layers, layerWords } from "../../../map/view";
import { useAsking } from "./context";

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
  const { inputs, scale } = useAsking();
  const [scaleOpen, setScaleOpen] = useState(false);
  return (
    <section aria-label="On the map" className="mt-5">
      <SectionHead aside="remembered for you">On the map</SectionHead>
      <Check checked={plain} onChange={onPlain}>
        All fields, nothing hatched <span className="font-mono text-muted">f</span>
      </Check>
      {layerNames.map((name) => (
        <Check key={name} checked={layers[name]} onChange={(on) => onLayer(name, on)}>
          {name === "crosscuts" ? <Term word="crosscut">{layerWords[name]}</Term> : layerWords[name]}
        </Check>
      ))}
      <Row label="Potentials in" className="mt-1">
        <Button kind="quiet" className="h-auto!" onClick={() => setScaleOpen(true)}>
          {scale.label}
        </Button>
      </Row>
      <PotentialScaleDialog open={scaleOpen} onOpenChange={setScaleOpen} liquorC={inputs.temperatureC} />
    </section>
  );
}
