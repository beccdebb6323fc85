import type { Network, NetworkAnswer, NetworkRequest } from '@/lib/offline/network';
import { type ModelServer, jsonAnswer } from './model-server';
import type { Weather } from './weather';
import type { Process, World } from './world';

/** What stands between one tab and the office. */
export interface SimNetworkPorts {
  world: World;
  weather: () => Weather;
  server: ModelServer;
  process: Process;
  user: string;
  /** Counts requests, so that a run can say how much it did. */
  sent(): void;
}

const LOST: NetworkAnswer = { kind: 'none', why: 'network' };
const TIMED_OUT: NetworkAnswer = { kind: 'none', why: 'timeout' };

/** What routers, captive portals and other services answer. */
function stranger(world: World): NetworkAnswer {
  const html = '<html><body>Welcome to the boat house network</body></html>';
  const page = { kind: 'answer', contentType: 'text/html', text: html, retryAfterMs: null } as const;
  return world.pick<NetworkAnswer>([
    { ...page, status: 200 },
    { ...page, status: 302 },
    { ...page, status: 401 },
    { ...page, status: 403 },
    { ...page, status: 511 },
    jsonAnswer(200, { ok: true }),
    jsonAnswer(200, { protocol: 2, epoch: 1, results: [] }),
    { kind: 'answer', status: 503, contentType: 'text/plain', text: 'busy', retryAfterMs: 2_000 },
    { kind: 'answer', status: 429, contentType: 'application/json', text: '{}', retryAfterMs: 1_000 },
  ]);
}

/** An answer of our office's form that says nothing about what was sent. */
function emptyResults(server: ModelServer): NetworkAnswer {
  return jsonAnswer(200, { protocol: 1, epoch: server.epoch, serverTime: '', safeSeq: 0, results: [] });
}

function cutShort(world: World, answer: NetworkAnswer): NetworkAnswer {
  if (answer.kind === 'none') return answer;
  return { ...answer, text: answer.text.slice(0, world.below(answer.text.length)) };
}

/** The network of one tab: loses, doubles, delays, cuts and forges, by the world's chance. */
export function simNetwork(ports: SimNetworkPorts): Network {
  const { world, server, process, user } = ports;
  const onTheWay = (weather: Weather) =>
    world.chance(weather.slow) ? world.between(5_000, 40_000) : world.between(10, weather.latencyMs);

  /** The office's side: it may die before or after its commit. */
  function atOffice(request: NetworkRequest): NetworkAnswer {
    const dies = world.chance(ports.weather().officeDies);
    const committed = !dies || world.chance(0.5);
    const answer = server.handle(request, user, committed);
    return dies ? LOST : answer;
  }

  async function deliver(request: NetworkRequest): Promise<{ answer: NetworkAnswer; ms: number }> {
    const weather = ports.weather();
    const there = onTheWay(weather);
    if (world.chance(weather.stranger)) {
      const forged = world.chance(0.2) ? emptyResults(server) : stranger(world);
      return { answer: forged, ms: there };
    }
    if (world.chance(weather.lost)) return { answer: world.chance(0.5) ? LOST : TIMED_OUT, ms: there };
    if (world.chance(weather.twice)) world.later(onTheWay(weather) * 3, () => void server.handle(request, user));
    let answer: NetworkAnswer = LOST;
    // The request reaches the office even when the tab dies meanwhile.
    await new Promise<void>((resolve) => world.later(there, () => ((answer = atOffice(request)), resolve())));
    const back = onTheWay(weather);
    if (world.chance(weather.lost)) answer = world.chance(0.3) ? LOST : TIMED_OUT;
    else if (world.chance(weather.cut)) answer = cutShort(world, answer);
    return { answer, ms: there + back };
  }

  return {
    async send(request) {
      ports.sent();
      const began = world.time;
      const { answer, ms } = await deliver(request);
      const late = answer === TIMED_OUT || ms > request.timeoutMs;
      const until = began + (late ? request.timeoutMs : ms);
      await world.wait(process, until - world.time);
      return late ? TIMED_OUT : answer;
    },
  };
}
