import sharp, { type Sharp } from 'sharp';
import type TestAgent from 'supertest/lib/agent.js';
import { beforeAll, describe, expect, it } from 'vitest';
import { preparePlate } from '../../server/plates/prepare.job.ts';
import { useApi } from '../support/api.ts';
import { makeRecipe } from '../support/factories.ts';
import { makePicture } from '../support/issued-book.ts';

const api = useApi();
let editor: TestAgent;
beforeAll(async () => {
  editor = await api.as({ roles: ['editor'] });
});

async function jpeg(width: number, height: number): Promise<Sharp> {
  return sharp({ create: { width, height, channels: 3, background: '#a8742f' }, limitInputPixels: false }).jpeg();
}

/** The beginning of a picture as telephones make it: `ftyp` with the brand `heic` (ISO/IEC 23008-12). */
const HEIC = Buffer.concat([
  Buffer.from([0, 0, 0, 24]),
  Buffer.from('ftypheic\0\0\0\0mif1heic', 'latin1'),
  Buffer.alloc(64, 7),
]);

async function prepareAll(): Promise<void> {
  for (const { id } of await api.db('plates').where({ state: 'preparing' }).select('id'))
    await preparePlate(api.ctx, { plateId: id }, { last: true });
}

describe('a batch of pictures', () => {
  it('keeps what is good and refuses by name, with its reason, what is not', async () => {
    const good = await (await jpeg(1200, 800)).toBuffer();
    const huge = await (await jpeg(12_000, 10_000)).toBuffer();
    const torn = good.subarray(0, 60);
    const { body } = await editor
      .post('/api/plates')
      .attach('plates', good, { filename: 'søl-bær.jpg', contentType: 'image/jpeg' })
      .attach('plates', Buffer.alloc(0), { filename: 'nothing.jpg', contentType: 'image/jpeg' })
      .attach('plates', Buffer.from('%PDF-1.7 not a picture at all'), {
        filename: 'paper.jpg',
        contentType: 'image/jpeg',
      })
      .attach('plates', HEIC, { filename: 'telephone.heic', contentType: 'image/heic' })
      .attach('plates', huge, { filename: 'poster.jpg', contentType: 'image/jpeg' })
      .attach('plates', torn, { filename: 'torn.jpg', contentType: 'image/jpeg' })
      .expect(201);

    expect(body.kept.map((plate: { originalName: string }) => plate.originalName)).toEqual(['søl-bær.jpg']);
    expect(
      Object.fromEntries(body.refused.map(({ name, code }: { name: string; code: string }) => [name, code])),
    ).toEqual({
      'nothing.jpg': 'plates.empty',
      'paper.jpg': 'plates.not_a_picture',
      'telephone.heic': 'plates.unsupported_format',
      'poster.jpg': 'plates.too_many_pixels',
      'torn.jpg': 'plates.unreadable',
    });
    expect(body.refused.find(({ name }: { name: string }) => name === 'poster.jpg').reason).toContain('120');
  });

  it('goes by content: a PNG under a wrong name and type is taken for what it is', async () => {
    const png = await sharp({ create: { width: 40, height: 30, channels: 4, background: '#1d4d3f' } })
      .png()
      .toBuffer();
    const { body } = await editor
      .post('/api/plates')
      .attach('plates', png, { filename: 'label.txt', contentType: 'text/plain' })
      .expect(201);
    expect(body.kept).toHaveLength(1);
  });
});

describe('the sizes of a plate', () => {
  it('are made in AVIF, WebP and JPEG, turned as the camera was held, without a trace of its metadata', async () => {
    const turned = await (
      await jpeg(1200, 800)
    )
      .withMetadata({ orientation: 6 })
      .withExif({ IFD0: { Copyright: 'Somebody Private' }, IFD3: { GPSLatitude: '60/1 23/1 0/1' } })
      .toBuffer();
    const { body } = await editor.post('/api/plates').attach('plates', turned, 'turned.jpg').expect(201);
    const { id, width, height } = body.kept[0];
    expect([width, height]).toEqual([800, 1200]);
    await prepareAll();

    const { body: plate } = await editor.get(`/api/plates/${id}`).expect(200);
    expect(plate.state).toBe('ready');
    expect(plate.renditions).toHaveLength(9);
    for (const { size, format, width: shown } of plate.renditions) {
      const picture = await editor.get(`/api/plates/${id}/${size}.${format}`).buffer(true).parse(bytes).expect(200);
      const metadata = await sharp(picture.body).metadata();
      expect(metadata.width).toBe(shown);
      expect(metadata.height! > metadata.width!).toBe(true);
      expect([metadata.exif, metadata.xmp, metadata.iptc, metadata.orientation ?? 1]).toEqual([
        undefined,
        undefined,
        undefined,
        1,
      ]);
      expect(picture.body.includes('Somebody Private')).toBe(false);
    }
    expect(Math.max(...plate.renditions.map((rendition: { width: number }) => rendition.width))).toBe(800);
  });

  it('are the same bytes when they are made twice', async () => {
    const { id, original_hash } = await makePicture(api.ctx);
    const before = await api.db('plates').where({ id }).first('renditions');
    await api.db('plates').where({ id }).update({ state: 'preparing' });
    await preparePlate(api.ctx, { plateId: id }, { last: true });
    const after = await api.db('plates').where({ id }).first('renditions', 'original_hash');
    expect(after).toEqual({ ...before, original_hash });
  });
});

describe('the words of a plate', () => {
  it('are saved on the version that was seen; a second editor is told and loses nothing', async () => {
    const { id } = await makePicture(api.ctx);
    const words = { alt: 'A jar of plums', caption: '', credit: 'Ebbfold Press' };
    await editor.put(`/api/plates/${id}`).set('If-Match', '"1"').send(words).expect(200);
    const late = await editor
      .put(`/api/plates/${id}`)
      .set('If-Match', '"1"')
      .send({ ...words, alt: 'Plums' })
      .expect(412);
    expect(late.body).toMatchObject({ code: 'request.version_conflict', context: { version: 2 } });
  });
});

describe('taking a plate away', () => {
  it('is refused while a recipe shows it', async () => {
    const plate = await makePicture(api.ctx);
    await makeRecipe(api.db, { leadPlateId: plate.id });
    const refused = await editor.delete(`/api/plates/${plate.id}`).expect(409);
    expect(refused.body.code).toBe('plates.in_use');
    const free = await makePicture(api.ctx);
    await editor.delete(`/api/plates/${free.id}`).expect(200);
    await editor.get(`/api/plates/${free.id}`).expect(404);
  });
});

function bytes(response: unknown, done: (error: Error | null, body: unknown) => void): void {
  const chunks: Buffer[] = [];
  const stream = response as NodeJS.ReadableStream;
  stream.on('data', (chunk: Buffer) => chunks.push(chunk));
  stream.on('end', () => done(null, Buffer.concat(chunks)));
}
