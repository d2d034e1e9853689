import { deflateSync, inflateSync } from 'node:zlib';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { repackPng } from '../../scripts/pictures/repack-png';

/*
 * The filters are written down here the other way round from the code under test: this filters, that takes filters away.
 * Source: W3C, Portable Network Graphics (third edition), section 9.2 and 9.4.
 */

type Picture = { readonly width: number; readonly height: number; readonly pointBytes: 3 | 4; readonly points: Buffer };

function chunk(type: string, data: Buffer): Buffer {
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  // The check bytes of what comes in are not looked at.
  return Buffer.concat([length, Buffer.from(type, 'latin1'), data, Buffer.alloc(4)]);
}

function pngOf({ width, height, pointBytes, points }: Picture, filters: readonly number[]): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header[8] = 8;
  header[9] = pointBytes === 3 ? 2 : 6;
  const lineBytes = width * pointBytes;
  const lines = Array.from({ length: height }, (_, line) => {
    const filter = filters[line % filters.length] ?? 0;
    const byte = (onLine: number, at: number) => (onLine < 0 || at < 0 ? 0 : (points[onLine * lineBytes + at] ?? 0));
    return Buffer.from([
      filter,
      ...Array.from({ length: lineBytes }, (_, at) => {
        const [a, b, c] = [byte(line, at - pointBytes), byte(line - 1, at), byte(line - 1, at - pointBytes)];
        const p = a + b - c;
        const nearest = [a, b, c].reduce((best, one) => (Math.abs(p - one) < Math.abs(p - best) ? one : best));
        const less = [0, a, b, Math.floor((a + b) / 2), nearest][filter] ?? 0;
        return (byte(line, at) - less + 256) % 256;
      }),
    ]);
  });
  const data = deflateSync(Buffer.concat(lines));
  const half = Math.floor(data.length / 2);
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', header),
    chunk('pHYs', Buffer.alloc(9)),
    chunk('IDAT', data.subarray(0, half)),
    chunk('IDAT', data.subarray(half)),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** The points of a picture without filters: what is left when each line's leading 0 is taken away. */
function plainPoints(png: Buffer, { width, pointBytes }: Picture): Buffer {
  const length = png.readUInt32BE(33);
  expect(png.toString('latin1', 37, 41)).toBe('IDAT');
  const lines = inflateSync(png.subarray(41, 41 + length));
  const lineBytes = width * pointBytes;
  const parts: Buffer[] = [];
  for (let from = 0; from < lines.length; from += lineBytes + 1) {
    expect(lines[from]).toBe(0);
    parts.push(lines.subarray(from + 1, from + 1 + lineBytes));
  }
  return Buffer.concat(parts);
}

const picture = fc
  .record({
    width: fc.integer({ min: 1, max: 9 }),
    height: fc.integer({ min: 1, max: 7 }),
    pointBytes: fc.constantFrom<3 | 4>(3, 4),
  })
  .chain((size) =>
    fc
      .uint8Array({
        minLength: size.width * size.height * size.pointBytes,
        maxLength: size.width * size.height * size.pointBytes,
      })
      .map((points): Picture => ({ ...size, points: Buffer.from(points) })),
  );

describe('a picture packed again', () => {
  it('has the same points, whatever filters it came with', () => {
    fc.assert(
      fc.property(picture, fc.array(fc.integer({ min: 0, max: 4 }), { minLength: 1, maxLength: 5 }), (one, filters) => {
        const packed = repackPng(pngOf(one, filters));
        expect(packed.subarray(16, 29)).toEqual(pngOf(one, filters).subarray(16, 29));
        expect(plainPoints(packed, one)).toEqual(one.points);
      }),
    );
  });

  it('carries the check bytes of the empty end chunk that every picture ends with', () => {
    const one: Picture = { width: 1, height: 1, pointBytes: 3, points: Buffer.from([1, 2, 3]) };
    // CRC-32 of the four letters IEND, as in any PNG file.
    expect(
      repackPng(pngOf(one, [1]))
        .subarray(-12)
        .toString('hex'),
    ).toBe('0000000049454e44ae426082');
  });

  it('is refused where it is no picture of a browser', () => {
    const one: Picture = { width: 1, height: 1, pointBytes: 3, points: Buffer.from([1, 2, 3]) };
    const grey = pngOf(one, [0]);
    grey[25] = 0;
    expect(() => repackPng(grey)).toThrow('This is not a picture as a browser writes it.');
    expect(() => repackPng(pngOf(one, [5]))).toThrow('A picture has no filter 5.');
  });
});
