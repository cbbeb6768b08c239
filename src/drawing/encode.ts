import { promisify } from 'node:util';
import { crc32, deflate } from 'node:zlib';

const packed = promisify<Buffer, Buffer>(deflate);

/** Red, green, blue and cover, a byte each. */
const BYTES_PER_DOT = 4;
const SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

/** Length, name, content and check sum, as the PNG standard lays a chunk out. */
const chunk = (name: string, content: Buffer): Buffer => {
  const body = Buffer.concat([Buffer.from(name, 'latin1'), content]);
  const whole = Buffer.alloc(body.length + 8);
  whole.writeUInt32BE(content.length, 0);
  body.copy(whole, 4);
  whole.writeUInt32BE(crc32(body), body.length + 4);
  return whole;
};

const header = (width: number, height: number): Buffer => {
  const content = Buffer.alloc(13);
  content.writeUInt32BE(width, 0);
  content.writeUInt32BE(height, 4);
  // Eight bits a channel, colour with cover.
  content.set([8, 6], 8);
  return content;
};

/**
 * A PNG packed off the main thread. The renderer's own packing runs on it, and stops every answer
 * for as long as it takes.
 */
export const pngOf = async (image: {
  readonly width: number;
  readonly height: number;
  readonly pixels: Buffer;
}): Promise<Uint8Array> => {
  const { width, height, pixels } = image;
  const stride = width * BYTES_PER_DOT;
  // Every row begins with its filter: none, which suits flat colours.
  const rows = Buffer.alloc((stride + 1) * height);
  for (let y = 0; y < height; y += 1)
    pixels.copy(rows, y * (stride + 1) + 1, y * stride, (y + 1) * stride);
  const body = await packed(rows);
  return new Uint8Array(
    Buffer.concat([
      SIGNATURE,
      chunk('IHDR', header(width, height)),
      chunk('IDAT', body),
      chunk('IEND', Buffer.alloc(0)),
    ]),
  );
};
