import type { HandlersOf } from '../../api/handler';
import { addLaser, addRod, changeLaser, changeRod, listInstruments } from './instrument-service';

export const instrumentHandlers: HandlersOf<'instruments' | 'addLaser' | 'changeLaser' | 'addRod' | 'changeRod'> = {
  instruments: ({ tenant }) => listInstruments(tenant),
  addLaser: ({ input, tenant }) => addLaser(tenant, input.body),
  changeLaser: ({ input, tenant }) => changeLaser(tenant, input.params.laserId, input.body),
  addRod: ({ input, tenant }) => addRod(tenant, input.body),
  changeRod: ({ input, tenant }) => changeRod(tenant, input.params.rodId, input.body),
};
