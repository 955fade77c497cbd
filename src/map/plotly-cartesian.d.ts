/** Plotly with the cartesian traces only; ships without types. It is only handed to react-plotly.js. */
declare module "plotly.js-cartesian-dist-min" {
  const Plotly: unknown;
  export default Plotly;
}
