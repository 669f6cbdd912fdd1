import enCommon from '@/assets/locales/en/common.json';
import enAuth from '@/assets/locales/en/auth.json';
import enErrors from '@/assets/locales/en/errors.json';
import enToday from '@/assets/locales/en/today.json';
import enJobs from '@/assets/locales/en/jobs.json';
import enFooting from '@/assets/locales/en/footing.json';
import enOutline from '@/assets/locales/en/outline.json';
import enStations from '@/assets/locales/en/stations.json';
import enLasers from '@/assets/locales/en/lasers.json';
import enCrew from '@/assets/locales/en/crew.json';
import enSetup from '@/assets/locales/en/setup.json';
import enShoot from '@/assets/locales/en/shoot.json';
import enResults from '@/assets/locales/en/results.json';
import enAccount from '@/assets/locales/en/account.json';
import enCharts from '@/assets/locales/en/charts.json';
import esCommon from '@/assets/locales/es/common.json';
import esAuth from '@/assets/locales/es/auth.json';
import esErrors from '@/assets/locales/es/errors.json';
import esToday from '@/assets/locales/es/today.json';
import esJobs from '@/assets/locales/es/jobs.json';
import esFooting from '@/assets/locales/es/footing.json';
import esOutline from '@/assets/locales/es/outline.json';
import esStations from '@/assets/locales/es/stations.json';
import esLasers from '@/assets/locales/es/lasers.json';
import esCrew from '@/assets/locales/es/crew.json';
import esSetup from '@/assets/locales/es/setup.json';
import esShoot from '@/assets/locales/es/shoot.json';
import esResults from '@/assets/locales/es/results.json';
import esAccount from '@/assets/locales/es/account.json';
import esCharts from '@/assets/locales/es/charts.json';

// Imported, not fetched: a phone in a trench has its words before it has a signal.
const en = {
  common: enCommon,
  auth: enAuth,
  errors: enErrors,
  today: enToday,
  jobs: enJobs,
  footing: enFooting,
  outline: enOutline,
  stations: enStations,
  lasers: enLasers,
  crew: enCrew,
  setup: enSetup,
  shoot: enShoot,
  results: enResults,
  account: enAccount,
  charts: enCharts,
};

const es = {
  common: esCommon,
  auth: esAuth,
  errors: esErrors,
  today: esToday,
  jobs: esJobs,
  footing: esFooting,
  outline: esOutline,
  stations: esStations,
  lasers: esLasers,
  crew: esCrew,
  setup: esSetup,
  shoot: esShoot,
  results: esResults,
  account: esAccount,
  charts: esCharts,
};

/** Every word the screens show: by language, then by screen family. `en` decides which keys there are. */
export const catalogues = { en, es };

export type Language = keyof typeof catalogues;
export type Family = keyof typeof en;
