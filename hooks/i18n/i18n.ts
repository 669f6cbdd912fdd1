import { createInstance } from 'i18next';
import { initReactI18next } from 'react-i18next';
import { catalogues, type Language } from './catalogues';

/** The first of the languages asked for that there is a catalogue for; English where there is none. */
export function chooseLanguage(asked: readonly string[]): Language {
  for (const tag of asked) {
    const base = tag.toLowerCase().split('-')[0];
    if (base === 'en' || base === 'es') return base;
  }
  return 'en';
}

const asked = typeof navigator === 'undefined' ? [] : (navigator.languages ?? [navigator.language]);

/** The one instance: `initReactI18next` makes it the one that `useTranslation` finds. */
export const i18n = createInstance();

// Synchronous, because the catalogues are in the bundle: the first drawing already has its words.
void i18n.use(initReactI18next).init({
  resources: catalogues,
  lng: chooseLanguage(asked),
  fallbackLng: 'en',
  defaultNS: 'common',
  ns: Object.keys(catalogues.en),
  initAsync: false,
  // React escapes what it draws.
  interpolation: { escapeValue: false },
  returnNull: false,
});

const tell = (language: string) => {
  // A screen reader picks its voice by the page's language.
  if (typeof document !== 'undefined') document.documentElement.lang = language;
};
tell(i18n.language);
i18n.on('languageChanged', tell);
