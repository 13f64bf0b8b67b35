import { CanvasTexture, LinearMipmapLinearFilter, NoColorSpace, RepeatWrapping } from 'three';

/** A pattern that is the same every time it is drawn: plain sine waves whose periods share no factor. */
const wander = (t: number, seed: number): number => Math.sin(t * 2.1 + seed) * 0.5 + Math.sin(t * 5.3 + seed * 2.7) * 0.3 + Math.sin(t * 11.9 + seed * 1.3) * 0.2;

/** Drawn once for the page: every rail has the same grain, and every program a picture of its own. */
const drawn = new Map<string, HTMLCanvasElement>();

function canvasOf(name: string, width: number, height: number, draw: (context: CanvasRenderingContext2D) => void): HTMLCanvasElement {
  const ready = drawn.get(name);
  if (ready) return ready;
  const canvas = document.createElement('canvas');
  canvas.width = width;
  canvas.height = height;
  const context = canvas.getContext('2d', { willReadFrequently: true }); // a texture is read from it: kept in memory, not on the card
  if (context) {
    context.fillStyle = '#000';
    context.fillRect(0, 0, width, height);
    context.strokeStyle = '#fff';
    draw(context);
  }
  drawn.set(name, canvas);
  return canvas;
}

function sheet(name: string, width: number, height: number, draw: (context: CanvasRenderingContext2D) => void): CanvasTexture {
  const texture = new CanvasTexture(canvasOf(name, width, height, draw));
  texture.colorSpace = NoColorSpace; // a mask, not a colour
  texture.wrapS = texture.wrapT = RepeatWrapping;
  texture.minFilter = LinearMipmapLinearFilter;
  texture.anisotropy = 8;
  return texture;
}

/** Lines of grain that run along the rail, eight widths to a sheet, with the short dashes of open pores. */
export function longGrain(): CanvasTexture {
  const [width, height] = [2048, 256];
  return sheet('long', width, height, (context) => {
    const turn = (2 * Math.PI) / width; // whole turns, so that the sheet joins itself
    for (let line = 0; line < 15; line++) {
      const y = ((line + 0.5) / 15) * height + wander(line, 1) * 5;
      const bow = 3 + 5 * Math.abs(wander(line, 4));
      context.globalAlpha = 0.35 + 0.4 * Math.abs(wander(line, 7));
      context.lineWidth = 1.2 + Math.abs(wander(line, 2)) * 2;
      context.beginPath();
      for (let x = 0; x <= width; x += 16) context.lineTo(x, y + bow * (Math.sin(x * turn * 2 + line) * 0.6 + Math.sin(x * turn * 5 + line * 3) * 0.4));
      context.stroke();
    }
    context.lineWidth = 1.6;
    for (let pore = 0; pore < 150; pore++) {
      const x = (pore * 613) % width; // a step that visits the whole sheet before it comes back
      const y = (pore * 97) % height;
      context.globalAlpha = 0.5;
      context.beginPath();
      context.moveTo(x, y);
      context.lineTo(x + 16 + 14 * wander(pore, 3), y + wander(pore, 5));
      context.stroke();
    }
  });
}

/** Growth rings about a heart below the rail, as the section drawing shows them. */
export function endGrain(): CanvasTexture {
  const side = 512;
  return sheet('end', side, side, (context) => {
    for (let ring = 0; ring < 26; ring++) {
      context.globalAlpha = 0.45 + 0.35 * wander(ring, 2);
      context.lineWidth = 2 + Math.abs(wander(ring, 6)) * 3;
      context.beginPath();
      context.arc(side * 0.42, side * 0.95, side * 0.08 + ring * 26 + wander(ring, 3) * 6, 0, 2 * Math.PI);
      context.stroke();
    }
  });
}
