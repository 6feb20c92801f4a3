// What a person waits for, in Chromium on the built product: from a key on a screw to redrawn tape, load picture and words; the longest
// task of the page meanwhile; the reference case S1 in the product's own worker; the JavaScript of the first view.
// With BROWSER_ADDRESS (with its closing slash) a product that runs there already is measured.
import { fork } from 'node:child_process';
import { mkdtempSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { chromium } from 'playwright-core';
import { ensureBuilt } from '../../server/launch/build.mjs';
import { findChromium } from '../../server/launch/ensure-chromium.mjs';
import { root } from '../../server/launch/paths.mjs';

const TURNS = 40;
const STOP = 'Max. vol. stop, P1';
const flags = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-sync'];

function answer(child, pick) {
  return new Promise((resolve, reject) => {
    child.on('message', (message) => {
      const found = pick(message);
      if (found) resolve(found);
    });
    child.on('exit', (code) => reject(new Error(`ended with exit code ${code}`)));
  });
}

/** The product as npm start runs it, with a database of its own. */
async function startProduct() {
  if (process.env.BROWSER_ADDRESS) return { address: process.env.BROWSER_ADDRESS, stop: async () => undefined };
  await ensureBuilt(console.log);
  const folder = mkdtempSync(join(tmpdir(), 'swashbench-bench-'));
  const keeper = fork(join(root, 'server/launch/postgres-keeper.mjs'), [JSON.stringify({ folder, careless: true, removeAfter: true })], {
    execArgv: [],
    detached: true,
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  const url = await answer(keeper, (message) => message.url);
  const server = fork(join(root, 'dist/server/main.js'), [], {
    execArgv: [],
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      DATABASE_URL: url,
      HOST: '127.0.0.1',
      PORT: '0',
      PUBLIC_URL: '',
      LOG_LEVEL: 'error',
    },
  });
  const address = await answer(server, (message) => (message.type === 'ready' ? message.local : undefined));
  const ended = (child) => new Promise((resolve) => child.once('exit', resolve));
  return {
    address,
    stop: async () => {
      for (const child of [server, keeper]) {
        const end = ended(child);
        child.disconnect();
        await end;
      }
    },
  };
}

/** Runs in the page before anything else: keeps the workers, their results, canvas strokes, and tasks over 50 ms. */
function instrument() {
  const seen = { workers: [], resultAt: 0, strokeAt: 0, tasks: [] };
  window.__seen = seen;
  const Plain = window.Worker;
  window.Worker = class extends Plain {
    constructor(url, options) {
      super(url, options);
      seen.workers.push(String(url));
      this.addEventListener('message', (event) => {
        if (event.data?.type === 'result') seen.resultAt = performance.now();
      });
    }
  };
  const { stroke } = CanvasRenderingContext2D.prototype;
  CanvasRenderingContext2D.prototype.stroke = function (...args) {
    seen.strokeAt = performance.now();
    return stroke.apply(this, args);
  };
  new PerformanceObserver((list) => {
    for (const entry of list.getEntries()) seen.tasks.push({ at: entry.startTime, length: entry.duration });
  }).observe({ type: 'longtask', buffered: true });
}

/** In the page: the next key's way to the screen [ms]: until a result is in, the tape has been drawn after it, the load picture has changed
 *  after it, nothing on the screen is stale, and the frame that shows it has been painted. */
function nextTurn() {
  const seen = window.__seen;
  return new Promise((resolve) => {
    window.addEventListener(
      'keydown',
      (event) => {
        const began = event.timeStamp;
        seen.resultAt = 0;
        let picture = 0;
        const watch = new MutationObserver(() => {
          picture = performance.now();
        });
        watch.observe(document.querySelector('.region-load'), { subtree: true, childList: true, attributes: true, characterData: true });
        const look = () => {
          const stale = document.querySelector('.tape[data-stale], [data-case] .chip[data-stale]');
          if (seen.resultAt === 0 || seen.strokeAt < seen.resultAt || picture < seen.resultAt || stale) {
            requestAnimationFrame(look);
            return;
          }
          const painted = new MessageChannel();
          painted.port1.onmessage = () => {
            watch.disconnect();
            const parts = { result: seen.resultAt - began, drawn: Math.max(seen.strokeAt, picture) - began };
            resolve({ ...parts, painted: performance.now() - began });
          };
          painted.port2.postMessage(null);
        };
        requestAnimationFrame(look);
      },
      { once: true, capture: true },
    );
  });
}

/** In the page: times of a document's first case in the product's own worker [ms], after warming up. */
function workerTimes({ url, document }) {
  const worker = new Worker(url, { type: 'module' });
  const times = [];
  return new Promise((resolve, reject) => {
    let began = 0;
    let request = 0;
    const ask = () => {
      request += 1;
      began = performance.now();
      worker.postMessage({ type: 'run', request, document, caseId: document.cases[0].id, tolerance: 'normal', urgent: false });
    };
    worker.onerror = (event) => reject(new Error(event.message));
    worker.onmessage = ({ data }) => {
      if (data.type === 'refused' || data.type === 'broken') reject(new Error(JSON.stringify(data).slice(0, 300)));
      if (data.type === 'result') times.push(performance.now() - began);
      if (data.type !== 'result' && data.type !== 'ready') return;
      if (times.length < 60) return ask();
      worker.terminate();
      resolve(times.slice(20));
    };
  });
}

const sorted = (values) => [...values].sort((a, b) => a - b);
const share = (values, at) => sorted(values)[Math.min(values.length - 1, Math.floor(values.length * at))];

async function turnScrew(page) {
  await page.getByRole('slider', { name: STOP }).focus();
  const times = [];
  let from = 0;
  for (let turn = 0; turn < TURNS + 8; turn++) {
    if (turn === 8) from = await page.evaluate(() => performance.now());
    const waiting = page.evaluate(nextTurn);
    // The listener stands before the key falls.
    await page.evaluate(() => undefined);
    await page.keyboard.press(turn % 4 < 2 ? 'ArrowUp' : 'ArrowDown');
    const time = await waiting;
    if (turn >= 8) times.push(time);
    // The run at normal tolerance, which follows once the screw rests, is not part of the next turn.
    await page.waitForTimeout(500);
  }
  const tasks = await page.evaluate((since) => window.__seen.tasks.filter((task) => task.at >= since).map((task) => task.length), from);
  return { times, tasks };
}

async function scriptSizes(address, workers) {
  const html = await (await fetch(address)).text();
  const first = [...html.matchAll(/<(?:script|link)\b[^>]*?(?:src|href)="([^"]+\.js)"/g)].map((match) => match[1]);
  const size = async (path) => gzipSync(Buffer.from(await (await fetch(new URL(path, address))).arrayBuffer())).length / 1000;
  const sum = async (paths) => (await Promise.all(paths.map(size))).reduce((total, one) => total + one, 0);
  return { page: await sum(first), workers: await sum([...new Set(workers)]) };
}

export async function measure() {
  const product = await startProduct();
  const browser = await chromium.launch({ executablePath: findChromium() ?? undefined, args: flags });
  try {
    const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, locale: 'en-GB' });
    const page = await context.newPage();
    await page.addInitScript(instrument);
    await page.goto(product.address);
    await page.locator('[data-case="C"] .chip[data-verdict="trips"]').waitFor();
    const firstWorkers = await page.evaluate(() => window.__seen.workers.filter((url) => url.includes('simulation')));
    await page.waitForTimeout(3000);
    const { times, tasks } = await turnScrew(page);
    const painted = times.map((time) => time.painted);
    const first = JSON.parse(readFileSync(join(root, 'tests/fixtures/circuits/v1/s1.json'), 'utf8'));
    const s1 = await page.evaluate(workerTimes, { url: firstWorkers[0], document: first });
    const scripts = await scriptSizes(product.address, firstWorkers);
    return [
      { name: 'screw to redrawn screen, median', value: share(painted, 0.5), unit: 'ms', goal: 50 },
      { name: 'the same, nine turns of ten', value: share(painted, 0.9), unit: 'ms' },
      {
        name: 'of it until the run is back, median',
        value: share(
          times.map((time) => time.result),
          0.5,
        ),
        unit: 'ms',
      },
      {
        name: 'of it until tape and load picture are drawn, median',
        value: share(
          times.map((time) => time.drawn),
          0.5,
        ),
        unit: 'ms',
      },
      { name: `longest task of the page in ${TURNS} turns (0: none over 50)`, value: Math.max(0, ...tasks), unit: 'ms', goal: 100 },
      { name: 'S1, 10 s at 1e-4 in the worker, warm, median', value: share(s1, 0.5), unit: 'ms', goal: 20 },
      { name: 'S1 in the worker, least', value: share(s1, 0), unit: 'ms' },
      { name: 'JavaScript of the first view, page, gzipped', value: scripts.page, unit: 'kB' },
      { name: 'JavaScript of the first view, worker, gzipped', value: scripts.workers, unit: 'kB' },
      { name: 'JavaScript of the first view, gzipped', value: scripts.page + scripts.workers, unit: 'kB', goal: 350 },
    ];
  } finally {
    await browser.close();
    await product.stop();
  }
}
