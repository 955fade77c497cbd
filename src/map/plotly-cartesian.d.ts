/** Plotly with the cartesian traces only; ships without types. The calls the map makes, and no others. */
declare module "plotly.js-cartesian-dist-min" {
  interface ImageWishes {
    format: "png" | "svg";
    width: number;
    height: number;
    scale?: number;
  }
  const Plotly: {
    toImage(figure: { data: unknown[]; layout: unknown; config?: unknown }, wishes: ImageWishes): Promise<string>;
  };
  export default Plotly;
}
