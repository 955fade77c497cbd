import type { Segment } from "../../shared/setpoint/segments";

/** A closed loop as border segments: corners counter-clockwise for the outer one, clockwise for a hole. */
export const loop = (corners: readonly (readonly [number, number])[]): Segment[] =>
  corners.map(([ax, ay], i) => {
    const [bx, by] = corners[(i + 1) % corners.length]!;
    return { ax, ay, bx, by };
  });

/** Every side cut into n equal parts, as limits of several species along one wall are. */
export const cutUp = (segments: readonly Segment[], n: number): Segment[] =>
  segments.flatMap(({ ax, ay, bx, by }) =>
    Array.from({ length: n }, (_, i) => ({
      ax: ax + ((bx - ax) * i) / n,
      ay: ay + ((by - ay) * i) / n,
      bx: ax + ((bx - ax) * (i + 1)) / n,
      by: ay + ((by - ay) * (i + 1)) / n,
    })),
  );

export const moved = (segments: readonly Segment[], u: number, v: number): Segment[] =>
  segments.map(({ ax, ay, bx, by }) => ({ ax: ax + u, ay: ay + v, bx: bx + u, by: by + v }));
