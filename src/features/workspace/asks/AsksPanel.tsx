import type { ReactNode } from "react";
import type { LayerName, Layers } from "../../../map/view";
import { AroundSection } from "./AroundSection";
import { HoldOverSection } from "./HoldOverSection";
import { KeptOutSection } from "./KeptOutSection";
import { LayersSection } from "./LayersSection";
import { LixiviantSection } from "./LixiviantSection";
import { MetalsSection } from "./MetalsSection";
import { BandsSection, FrameSection, TemperatureSection, WaterSection } from "./SheetSections";
import { SolidsSection } from "./SolidsSection";

/** The left side: everything the plan asks, and what the map shows of it. */
export function AsksPanel(props: {
  layers: Layers;
  onLayer: (name: LayerName, on: boolean) => void;
  plain: boolean;
  onPlain: (plain: boolean) => void;
  /** what the layers show, and which of it */
  more?: ReactNode;
}) {
  return (
    <>
      <MetalsSection />
      <LixiviantSection />
      <TemperatureSection />
      <SolidsSection />
      <FrameSection />
      <WaterSection />
      <KeptOutSection />
      <AroundSection />
      <BandsSection />
      <HoldOverSection />
      <div className="no-print">
        <LayersSection {...props} />
        {props.more}
      </div>
    </>
  );
}
