import type { Href } from 'expo-router';
import type { Waiting } from '@/shared/api/job-endpoints';
import { roundInHand } from '@/components/footing/round-in-hand';
import { i18n } from '@/hooks/i18n/i18n';

export interface WaitingWords {
  title: string;
  /** Where and how far: the job, then what is known of the round. */
  note: string;
  button: string;
  href: Href;
}

/** Where a thing that waits is done. One that lacks its own id leads to the list it is in. */
function hrefOf({ what, jobId, footingId, roundId, shot }: Waiting): Href {
  if (what === 'enter-laser') return '/lasers/new';
  if (what === 'enter-job') return '/jobs/new';
  if (roundId !== null && what === 'see-results') return { pathname: '/rounds/[roundId]/results', params: { roundId } };
  if (roundId !== null && what === 'finish-round') {
    return roundInHand({ id: roundId, shot });
  }
  if (footingId !== null && what === 'draw-outline') return { pathname: '/footings/[footingId]/outline', params: { footingId } };
  if (footingId !== null && what === 'set-stations') return { pathname: '/footings/[footingId]/stations', params: { footingId } };
  if (footingId !== null) return { pathname: '/footings/[footingId]', params: { footingId } };
  return jobId === null ? '/jobs' : { pathname: '/jobs/[jobId]', params: { jobId } };
}

/** What waits, said as the thing to do, with the button that does it. */
export function waitingWords(waiting: Waiting): WaitingWords {
  const { what, shot, of } = waiting;
  const counted =
    what === 'finish-round' && shot !== null && of !== null && of > 0 ? i18n.t('today:counted', { shot, of }) : null;
  const place = waiting.jobName;
  return {
    title: i18n.t(`today:waiting.${what}.title`, { footing: waiting.footingName ?? '' }),
    note: [place, counted ?? i18n.t(`today:waiting.${what}.note`)].filter((part) => part !== null && part !== '').join(' · '),
    button: what === 'finish-round' && shot === 0 ? i18n.t('today:setUp') : i18n.t(`today:waiting.${what}.button`),
    href: hrefOf(waiting),
  };
}
