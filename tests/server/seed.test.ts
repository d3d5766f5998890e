import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { demoPeople } from '../../server/services/demo/demo-people';
import { demoStrips } from '../../server/services/demo/demo-strips';
import { seedDemo } from '../../server/services/demo/seed-demo';
import { shipGallery } from '../../server/services/strips/ship-gallery';
import { gallery, presetParameters } from '../../shared/gallery/gallery';
import { startTestServer, type TestServer } from '../support/server/test-server';

let server: TestServer;
beforeEach(async () => {
  server = await startTestServer();
});
afterEach(() => server.close());

const later = new Date('2026-06-01T00:00:00.000Z');

describe('the demonstration', () => {
  it('is laid into an empty database only', async () => {
    const before = await server.database.users.findAll({ raw: true });
    expect(before).toHaveLength(demoPeople.length);
    expect(await seedDemo(server.database, later)).toBe(false);
    expect(await server.database.users.findAll({ raw: true })).toEqual(before);
  });

  it('stays away once its people are others', async () => {
    await server.database.users.destroy({ where: { id: 'demo-learner' } });
    expect(await seedDemo(server.database, later)).toBe(false);
    expect(await server.database.users.count()).toBe(demoPeople.length - 1);
  });

  it('has five strips of its own, private and shared, by two people', () => {
    expect(demoStrips).toHaveLength(5);
    expect(new Set(demoStrips.map((strip) => strip.visibility))).toEqual(new Set(['private', 'department']));
    expect(new Set(demoStrips.map((strip) => strip.ownerId)).size).toBe(2);
  });

  it('keeps no password as it is', async () => {
    const rows = JSON.stringify(await server.database.users.findAll({ raw: true }));
    for (const { password } of demoPeople) expect(rows).not.toContain(password);
  });
});

describe('the gallery', () => {
  it('is in the database as it ships', async () => {
    const educator = await server.signedIn('educator');
    for (const preset of gallery) {
      expect(await educator.read(preset.id)).toMatchObject({
        title: preset.title,
        teachingPoint: preset.teachingPoint,
        tags: preset.tags,
        group: preset.group,
        parameters: presetParameters(preset),
        keptBy: 'gallery',
        version: 1,
      });
    }
  });

  it('is left alone when it is as shipped', async () => {
    const before = await server.database.strips.findAll({ raw: true });
    await shipGallery(server.database, later);
    expect(await server.database.strips.findAll({ raw: true })).toEqual(before);
  });

  it('is brought up to what ships: changed presets, dropped ones, ones that were hidden', async () => {
    const [first, second] = gallery;
    const row = await server.database.strips.findByPk(first.id, { raw: true });
    await server.database.strips.update({ title: 'Old', shippedStamp: 'old' }, { where: { id: first.id } });
    await server.database.strips.update({ deletedAt: '2026' }, { where: { id: second.id } });
    await server.database.strips.create({ ...row!, id: 'no-longer-shipped' });
    await shipGallery(server.database, later);
    const educator = await server.signedIn('educator');
    expect(await educator.read(first.id)).toMatchObject({ title: first.title, version: 2, tags: first.tags });
    expect(await educator.read(second.id)).toMatchObject({ title: second.title });
    expect((await educator.get('/api/strips/no-longer-shipped')).status).toBe(404);
  });
});
