import type { HandlersOf } from '../../api/handler';
import { readRecords, sendRecords } from '../records/record-service';
import { changeRound, openRound, readRound } from './round-service';

export const roundHandlers: HandlersOf<'openRound' | 'round' | 'changeRound' | 'records' | 'sendRecords'> = {
  openRound: ({ input, tenant }) => openRound(tenant, input.params.footingId, input.body),
  round: ({ input, tenant }) => readRound(tenant, input.params.roundId),
  changeRound: ({ input, tenant }) => changeRound(tenant, input.params.roundId, input.body.closed),
  records: ({ input, tenant }) => readRecords(tenant, input.params.roundId, input.query.after),
  sendRecords: async ({ input, tenant }) => ({ answers: await sendRecords(tenant, input.params.roundId, input.body) }),
};
