import { callApi } from '../api/client';
import { BrowserStorage } from './browser-storage';
import { Outbox, type OutboxNews, type OutboxParts } from './outbox';

const LOCK = 'tallyrod.outbox-sender';
const CHANNEL = 'tallyrod.outbox';

/** One sender per browser. Without the Locks API (a page not served over https) each tab sends: the server answers "already". */
function alone<T>(work: () => Promise<T>): Promise<T> {
  return navigator.locks ? navigator.locks.request(LOCK, work) : work();
}

const post: OutboxParts['post'] = async (roundId, kept) => {
  const body = { sentAt: new Date().toISOString(), records: kept.map(({ record }) => record) };
  return (await callApi('sendRecords', { params: { roundId }, body })).answers;
};

/** As if nobody had caught it: it reaches the console and whoever listens for faults of the page. */
function report(error: unknown): void {
  if (typeof reportError === 'function') reportError(error);
}

function create(): Outbox {
  const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(CHANNEL);
  const outbox = new Outbox({
    storage: new BrowserStorage(),
    post,
    now: () => Date.now(),
    alone,
    after: (ms, work) => {
      const timer = setTimeout(work, ms);
      return () => clearTimeout(timer);
    },
    tell: (news) => channel?.postMessage(news),
    report,
  });
  channel?.addEventListener('message', (event: MessageEvent<OutboxNews>) => void outbox.heard(event.data));
  window.addEventListener('online', () => outbox.send());
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible') outbox.send();
  });
  return outbox;
}

let only: Outbox | null = null;

/** The outbox of this page, made on first use. */
export function browserOutbox(): Outbox {
  only ??= create();
  return only;
}
