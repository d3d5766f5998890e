import type { Drawing, DrawingRole, LineItem, PolylineItem, TextItem } from '../../../shared/paper/drawing';

export function polylines(drawing: Drawing, role: DrawingRole): PolylineItem[] {
  return drawing.items.filter((item) => item.kind === 'polyline').filter((item) => item.role === role);
}

export function lines(drawing: Drawing, role: DrawingRole): LineItem[] {
  return drawing.items.filter((item) => item.kind === 'line').filter((item) => item.role === role);
}

export function texts(drawing: Drawing, role: DrawingRole): TextItem[] {
  return drawing.items.filter((item) => item.kind === 'text').filter((item) => item.role === role);
}

/** x and y of a polyline apart. */
export function coordinates(points: Float64Array): { x: number[]; y: number[] } {
  return {
    x: Array.from(points.filter((_, i) => i % 2 === 0)),
    y: Array.from(points.filter((_, i) => i % 2 === 1)),
  };
}

/** y of a polyline at x, along the straight line between its points. */
export function heightAt(points: Float64Array, xMm: number): number {
  for (let i = 2; i < points.length; i += 2) {
    if (points[i] < xMm) continue;
    const share = (xMm - points[i - 2]) / (points[i] - points[i - 2]);
    return points[i - 1] + share * (points[i + 1] - points[i - 1]);
  }
  return points[points.length - 1];
}
