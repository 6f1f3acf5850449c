import type { Shape, Surface } from "./surface.js";

export function canvasSurface(context: CanvasRenderingContext2D, font: string): Surface {
  return {
    fill(x, y, width, height, colour) {
      context.fillStyle = colour;
      context.fillRect(x, y, width, height);
    },
    line(points, { colour, width, dash = [] }) {
      context.strokeStyle = colour;
      context.lineWidth = width;
      context.setLineDash([...dash]);
      context.beginPath();
      let isDown = false;
      for (let index = 0; index + 1 < points.length; index += 2) {
        const [x, y] = [points[index] as number, points[index + 1] as number];
        if (!Number.isFinite(x) || !Number.isFinite(y)) isDown = false;
        else if (isDown) context.lineTo(x, y);
        else {
          context.moveTo(x, y);
          isDown = true;
        }
      }
      context.stroke();
    },
    shape(shape, x, y, radius, colour, hollow = false) {
      context.beginPath();
      trace(context, shape, x, y, radius);
      const isOpen = hollow || shape === "cross" || shape === "plus";
      if (isOpen) {
        context.strokeStyle = colour;
        context.lineWidth = 1.5;
        context.setLineDash([]);
        context.stroke();
      } else {
        context.fillStyle = colour;
        context.fill();
      }
    },
    text(text, x, y, { colour, size, align, turned = false }) {
      context.save();
      context.fillStyle = colour;
      context.font = `${size}px ${font}`;
      context.textAlign = align === "middle" ? "center" : align;
      context.textBaseline = "alphabetic";
      context.translate(x, y);
      if (turned) context.rotate(-Math.PI / 2);
      context.fillText(text, 0, 0);
      context.restore();
    },
    clip(x, y, width, height) {
      context.save();
      context.beginPath();
      context.rect(x, y, width, height);
      context.clip();
    },
    release: () => context.restore(),
  };
}

function trace(context: CanvasRenderingContext2D, shape: Shape, x: number, y: number, r: number): void {
  switch (shape) {
    case "circle":
      context.arc(x, y, r, 0, 2 * Math.PI);
      return;
    case "square":
      context.rect(x - 0.9 * r, y - 0.9 * r, 1.8 * r, 1.8 * r);
      return;
    case "triangle":
      polygon(context, [x, y - 1.2 * r, x + 1.1 * r, y + 0.8 * r, x - 1.1 * r, y + 0.8 * r]);
      return;
    case "diamond":
      polygon(context, [x, y - 1.3 * r, x + 1.1 * r, y, x, y + 1.3 * r, x - 1.1 * r, y]);
      return;
    case "cross":
      context.moveTo(x - r, y - r);
      context.lineTo(x + r, y + r);
      context.moveTo(x - r, y + r);
      context.lineTo(x + r, y - r);
      return;
    case "plus":
      context.moveTo(x - 1.2 * r, y);
      context.lineTo(x + 1.2 * r, y);
      context.moveTo(x, y - 1.2 * r);
      context.lineTo(x, y + 1.2 * r);
  }
}

function polygon(context: CanvasRenderingContext2D, points: readonly number[]): void {
  for (let index = 0; index < points.length; index += 2) {
    const [x, y] = [points[index] as number, points[index + 1] as number];
    if (index === 0) context.moveTo(x, y);
    else context.lineTo(x, y);
  }
  context.closePath();
}
