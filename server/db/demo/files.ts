import { crc32, deflateSync } from 'node:zlib';

import type { DemoFileKey } from './story';

export interface DemoFile {
  name: string;
  bytes: Buffer;
}

/** A peak list as an instrument exports it: the eight lines of two doublets of one CH=CH, with an aromatic multiplet left out. */
const PEAK_LIST = [
  '# invented for the demo of Throughbond; 500.13 MHz, CDCl3, 298.0 K',
  'line,shift_ppm,shift_hz,height',
  '1,7.6952,3848.60,0.96',
  '2,7.6638,3832.90,1.04',
  '3,6.4357,3218.69,1.03',
  '4,6.4043,3202.99,0.97',
  '',
].join('\r\n');

/** Two Lorentzian lines 15.7 Hz apart, as a picture. */
const PICTURE = { width: 480, height: 200, hzAcross: 48, jHz: 15.7, widthHz: 1.4 } as const;

/** The two small files of the demo. They are made here, byte for byte the same each time, and nothing is fetched. */
export function demoFile(key: DemoFileKey): DemoFile {
  return key === 'peakList'
    ? { name: 'VN-011 peak list.csv', bytes: Buffer.from(PEAK_LIST, 'utf8') }
    : { name: 'VN-011 H3 expansion.png', bytes: doubletPicture() };
}

/** Draws the doublet and packs it as an 8-bit grey PNG. */
function doubletPicture(): Buffer {
  const { width, height, hzAcross, jHz, widthHz } = PICTURE;
  const rows = Buffer.alloc((width + 1) * height, 0xff);
  const signal = (x: number): number => {
    const hz = (x / width - 0.5) * hzAcross;
    return [-jHz / 2, jHz / 2].reduce((sum, line) => sum + 1 / (1 + ((hz - line) / (widthHz / 2)) ** 2), 0);
  };
  const rowOf = (x: number): number => Math.round(height - 16 - signal(x) * (height - 40));
  for (let y = 0; y < height; y += 1) rows[y * (width + 1)] = 0;
  for (let x = 0; x < width; x += 1) {
    const [from, to] = [rowOf(x), rowOf(x + 1)].sort((a, b) => a - b) as [number, number];
    for (let y = from; y <= to; y += 1) rows[y * (width + 1) + 1 + x] = 0x20;
  }
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header.set([8, 0, 0, 0, 0], 8);
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', header), chunk('IDAT', deflateSync(rows, { level: 9 })), chunk('IEND', Buffer.alloc(0)),
  ]);
}

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'ascii'), data]);
  const frame = Buffer.alloc(8 + body.length);
  frame.writeUInt32BE(data.length, 0);
  body.copy(frame, 4);
  frame.writeUInt32BE(crc32(body), 4 + body.length);
  return frame;
}
