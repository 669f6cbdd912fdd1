import type { HandlersOf } from '../../api/handler';
import { addFooting, changeFooting, readFooting } from './footing-service';
import { setOutline } from './outline-service';
import { addStation, changeStation, removeStation, setStations } from './station-service';

type Names =
  'addFooting' | 'footing' | 'changeFooting' | 'setOutline' | 'setStations' | 'addStation' | 'changeStation' | 'removeStation';

export const footingHandlers: HandlersOf<Names> = {
  addFooting: ({ input, tenant }) => addFooting(tenant, input.params.jobId, input.body),
  footing: ({ input, tenant }) => readFooting(tenant, input.params.footingId),
  changeFooting: ({ input, tenant }) => changeFooting(tenant, input.params.footingId, input.body),
  setOutline: ({ input, tenant }) => setOutline(tenant, input.params.footingId, input.body),
  setStations: ({ input, tenant }) => setStations(tenant, input.params.footingId, input.body.spacing),
  addStation: ({ input, tenant }) => addStation(tenant, input.params.footingId, input.body.at),
  changeStation: ({ input, tenant }) => changeStation(tenant, input.params.stationId, input.body),
  removeStation: ({ input, tenant }) => removeStation(tenant, input.params.stationId),
};
