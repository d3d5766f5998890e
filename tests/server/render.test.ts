import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createStripStream, renderStrip } from '../../shared/engine/render';
import { limbLeadOfIAndII, measuredLeads } from '../../shared/engine/leads';
import { decodeStripBinary, type DecodedStrip } from '../../shared/formats/strip-binary';
import { galleryPreset, presetParameters } from '../../shared/gallery/gallery';
import { parseStripParameters } from '../../shared/parameters/parse';
import { leadNames } from '../../shared/parameters/sheet';
import { createRenderPool } from '../../server/services/rendering/render-pool';
import { errorIdOf, type Answer, type ApiClient } from '../support/server/api-client';
import { startTestServer, workerFile, type TestServer } from '../support/server/test-server';

let server: TestServer;
let educator: ApiClient;

async function start(pool: Parameters<typeof startTestServer>[0] = {}): Promise<void> {
  server = await startTestServer(pool);
  educator = await server.signedIn('educator');
}
afterEach(() => server.close());

async function render(body: unknown, signal?: AbortSignal): Promise<Response> {
  return educator.raw('POST', '/api/strips/render', {
    body: JSON.stringify(body),
    headers: { 'content-type': 'application/json' },
    signal,
  });
}

async function rendered(body: unknown): Promise<DecodedStrip> {
  const response = await render(body);
  expect(response.status).toBe(200);
  expect(response.headers.get('content-type')).toContain('application/octet-stream');
  return decodeStripBinary(await response.arrayBuffer());
}

async function refusal(response: Response): Promise<Answer> {
  return { status: response.status, headers: response.headers, body: await response.json() };
}

/** Takes the engine several seconds. */
const heavy = parseStripParameters({
  durationS: 300,
  disturbance: { muscleMv: 0.05, baselineWanderMv: 0.1, mainsMv: 0.05 },
  recorder: { sampleRateHz: 2000 },
});

async function until(condition: () => boolean): Promise<void> {
  while (!condition()) await new Promise((done) => setTimeout(done, 5));
}

describe('a render', () => {
  beforeEach(() => start());

  it('of parameters is what the engine gives here, to the last bit', async () => {
    const parameters = {
      durationS: 6,
      seed: 7,
      pacing: { source: 'implanted', mode: 'DDD' },
      disturbance: { muscleMv: 0.02 },
    };
    const { sampleType, ...strip } = await rendered({ parameters });
    expect(sampleType).toBe('float32');
    const own = renderStrip(parseStripParameters(parameters));
    for (const lead of leadNames) expect(strip.leads[lead]).toEqual(own.leads[lead]);
    expect(strip.events).toEqual(own.events);
    expect(strip.reading).toEqual(own.reading);
    expect({ ...strip, leads: null }).toEqual({ ...own, leads: null });
  });

  it('of a saved strip is what its parameters give', async () => {
    const { leads, parameters } = await rendered({ stripId: 'spikes-over-asystole' });
    const wanted = presetParameters(galleryPreset('spikes-over-asystole'));
    expect(parameters).toEqual(wanted);
    expect(leads).toEqual(renderStrip(wanted).leads);
  });

  it('before the quantiser gives the doubles of the stream', async () => {
    const parameters = parseStripParameters({ durationS: 2, pacing: { source: 'implanted' } });
    const strip = await rendered({ parameters, unquantised: true });
    const { measured } = createStripStream(parameters).next(1000);
    for (const lead of measuredLeads) expect(strip.leads[lead]).toEqual(measured[lead]);
    const [ofI, ofII] = limbLeadOfIAndII.aVF ?? [NaN, NaN];
    const aVF = measured.I.map((value, k) => ofI * value + ofII * measured.II[k]);
    expect(strip.leads.aVF).toEqual(aVF);
  });

  it('of more than 300 s is refused before any work', async () => {
    const answer = await refusal(await render({ parameters: { durationS: 301 } }));
    expect(answer.status).toBe(400);
    expect(errorIdOf(answer)).toBe('longStrip');
  });

  it('of a saved strip of more than 300 s is refused too', async () => {
    const { id } = await educator.keep({ title: 'An hour', parameters: { durationS: 3600 } });
    expect(errorIdOf(await refusal(await render({ stripId: id })))).toBe('longStrip');
  });

  it('of parameters that cannot be is refused with the field', async () => {
    const answer = await refusal(await render({ parameters: { durationS: 0 } }));
    expect(errorIdOf(answer)).toBe('invalidInput');
    expect(JSON.stringify(answer.body)).toContain('parameters.durationS');
  });
});

describe('a busy server', () => {
  it('answers at once when its queue is full, and goes on answering other requests', async () => {
    const renderPool = createRenderPool({ workerFile, threads: 1, queueLength: 1, keepWarm: false });
    await start({ renderPool });
    const leaving = new AbortController();
    const first = render({ parameters: heavy }, leaving.signal).catch(() => null);
    await until(() => renderPool.load().running === 1);
    const second = render({ parameters: heavy }, leaving.signal).catch(() => null);
    await until(() => renderPool.load().waiting === 1);
    const third = await refusal(await render({ parameters: {} }));
    expect(third.status).toBe(503);
    expect(errorIdOf(third)).toBe('renderQueueFull');
    expect(Number(third.headers.get('retry-after'))).toBeGreaterThan(0);
    expect((await educator.get('/api/strips')).status).toBe(200);
    leaving.abort();
    await Promise.all([first, second]);
  });

  it('frees the thread of a client that left, and the place of one that waited', async () => {
    const renderPool = createRenderPool({ workerFile, threads: 1, queueLength: 1, keepWarm: false });
    await start({ renderPool });
    const leaving = new AbortController();
    const gone = [1, 2].map(() => render({ parameters: heavy }, leaving.signal).catch(() => 'left'));
    await until(() => renderPool.load().running === 1 && renderPool.load().waiting === 1);
    leaving.abort();
    expect(await Promise.all(gone)).toEqual(['left', 'left']);
    await until(() => renderPool.load().running === 0 && renderPool.load().waiting === 0);
    const next = await rendered({ parameters: { durationS: 1 } });
    expect(next.leads.II).toHaveLength(500);
    expect(server.logged).toEqual([]);
  });

  it('stops a render that takes too long, and frees its place', async () => {
    const renderPool = createRenderPool({ workerFile, threads: 1, timeLimitMs: 60, keepWarm: false });
    await start({ renderPool });
    const answer = await refusal(await render({ parameters: heavy }));
    expect(answer.status).toBe(504);
    expect(errorIdOf(answer)).toBe('renderTooLong');
    await until(() => renderPool.load().running === 0);
    expect(server.logged).toEqual([]);
  });
});
