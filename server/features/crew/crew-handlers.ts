import type { HandlersOf } from '../../api/handler';
import { changeRoles, listCrew } from './crew-service';

export const crewHandlers: HandlersOf<'crew' | 'changeRoles'> = {
  crew: async ({ tenant }) => ({ people: await listCrew(tenant) }),
  changeRoles: ({ input, tenant }) => changeRoles(tenant, input.params.personId, input.body.roles),
};
