import 'i18next';
import type { catalogues } from './catalogues';

// A key that is in no catalogue is a type error, not an empty button.
declare module 'i18next' {
  interface CustomTypeOptions {
    defaultNS: 'common';
    resources: (typeof catalogues)['en'];
  }
}
