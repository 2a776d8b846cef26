import sharp, { type Sharp } from 'sharp';
import { describe, expect } from 'vitest';
import { test } from '../support/api.ts';
import { startNote } from '../support/notes.ts';
import {
  allSizes,
  fetchedSize as fetched,
  keptPicture as kept,
  plainPicture,
  pngClaiming,
  storedFiles as stored,
} from '../support/pictures.ts';

const bytes = (text: string) => new Uint8Array(Buffer.from(text));

describe('what is served', () => {
  test('is new: no place, no name, no script of the original is left', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const xmp = '<x:xmpmeta xmlns:x="adobe:ns:meta/"><a>CANARY</a></x:xmpmeta>';
    const told = plainPicture(600, 400)
      .withExif({
        IFD0: { Copyright: 'CANARY', ImageDescription: 'CANARY' },
        IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' },
      })
      .withXmp(xmp);
    const jpeg = await told.clone().jpeg().toBuffer();
    const iptc = bytes('Photoshop 3.0\x008BIM\x04\x04\0\0\0\0\0\x0eCANARY iptc...');
    const segment = Buffer.concat([
      Buffer.from([0xff, 0xed, 0, iptc.length + 2]),
      iptc,
      Buffer.from([0xff, 0xfe, 0, 8]),
      bytes('CANARY'),
    ]);
    const zip = bytes('PK\x03\x04CANARY<script>CANARY</script><?php CANARY ?>');
    const images: Uint8Array[] = [
      Buffer.concat([jpeg.subarray(0, 2), segment, jpeg.subarray(2), zip]),
      Buffer.concat([await told.clone().png().toBuffer(), zip]),
      Buffer.concat([await told.clone().webp().toBuffer(), zip]),
      pngClaiming(8, 8, { rows: 8, extra: [['tEXt', bytes('Comment\0<script>CANARY</script>')]] }),
    ];
    for (const image of images) {
      expect(Buffer.from(image).includes('CANARY')).toBe(true);
      const picture = await kept(author, draft.id, image);
      for (const served of await allSizes(api, author, picture)) {
        for (const word of ['CANARY', 'GPS', 'script', 'PK\x03\x04', 'Exif', 'xmpmeta']) {
          expect(served.includes(word), word).toBe(false);
        }
      }
      // Nor is the original anywhere in the store.
      expect((await stored(api)).filter((name) => !/\d\.webp$|preview\.jpg$/.test(name))).toEqual(
        [],
      );
    }
  });

  test('stands upright whatever the camera wrote down, and in the colours it had', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const quarter = await sharp({
      create: { width: 100, height: 50, channels: 3, background: '#00f' },
    })
      .png()
      .toBuffer();
    // Red, with its lower right quarter blue: 200 wide, 100 high.
    const upright = await plainPicture(200, 100, '#f00')
      .composite([{ input: quarter, gravity: 'southeast' }])
      .png()
      .toBuffer();
    // How each orientation's pixels lie on the sensor, from the upright picture (EXIF 2.32, 4.6.4).
    const laid: Record<number, (image: Sharp) => Sharp> = {
      1: (image) => image,
      2: (image) => image.flop(),
      3: (image) => image.rotate(180),
      4: (image) => image.flip(),
      // The library mirrors before it turns.
      5: (image) => image.rotate(270).flop(),
      6: (image) => image.rotate(270),
      7: (image) => image.rotate(90).flop(),
      8: (image) => image.rotate(90),
    };
    for (const [orientation, lay] of Object.entries(laid)) {
      const sensor = await lay(sharp(upright)).png().toBuffer();
      const image = await sharp(sensor)
        .withMetadata({ orientation: Number(orientation) })
        .jpeg({ quality: 95 })
        .toBuffer();
      const picture = await kept(author, draft.id, image);
      expect([picture.width, picture.height], orientation).toEqual([200, 100]);
      const served = await fetched(api, author, picture, '200.webp');
      const { data } = await sharp(served)
        .removeAlpha()
        .raw()
        .toBuffer({ resolveWithObject: true });
      const at = (x: number, y: number) => [
        ...data.subarray((y * 200 + x) * 3, (y * 200 + x) * 3 + 3),
      ];
      const isBlue = (x: number, y: number): boolean => {
        const [red = 0, , blue = 0] = at(x, y);
        expect(Math.abs(blue - red), orientation).toBeGreaterThan(200);
        return blue > red;
      };
      const quarters = [isBlue(50, 20), isBlue(150, 20), isBlue(50, 80), isBlue(150, 80)];
      expect(quarters, orientation).toEqual([false, false, false, true]);
    }
  });

  test('is in sRGB with 8 bits, from CMYK, wide gamut, 16 bits and grey', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const red = plainPicture(60, 40, '#c04020');
    const images: [string, Uint8Array][] = [
      ['CMYK', await red.clone().toColourspace('cmyk').withIccProfile('cmyk').jpeg().toBuffer()],
      ['Display P3', await red.clone().withIccProfile('p3').png().toBuffer()],
      ['16 bits', await red.clone().toColourspace('rgb16').png().toBuffer()],
    ];
    for (const [what, image] of images) {
      const picture = await kept(author, draft.id, image);
      const served = sharp(await fetched(api, author, picture, '60.webp'));
      const { space, depth, icc } = await served.metadata();
      expect([space, depth, icc], what).toEqual(['srgb', 'uchar', undefined]);
      const { channels } = await served.stats();
      const means = channels.slice(0, 3).map(({ mean }) => mean);
      for (const [index, wanted] of [0xc0, 0x40, 0x20].entries()) {
        expect(Math.abs((means[index] ?? 0) - wanted), what).toBeLessThan(26);
      }
    }
    const grey = await plainPicture(60, 40, '#808080').toColourspace('b-w').png().toBuffer();
    const picture = await kept(author, draft.id, grey);
    const { channels } = await sharp(await fetched(api, author, picture, '60.webp')).stats();
    for (const { mean } of channels.slice(0, 3)) expect(Math.abs(mean - 0x80)).toBeLessThan(4);
  });
});
