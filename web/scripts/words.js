/**
 * Words for people, and numbers and dates as their language writes them.
 *
 * Every sentence on the page comes from a Fluent file; the engine's codes become sentences here.
 */
import { FluentBundle, FluentResource } from '@fluent/bundle';
import english from '../words/en.ftl';
import french from '../words/fr.ftl';

/** Languages by their tag, each with its own name for itself. */
export const LANGUAGES = {
  // Day before month, as the registers themselves mostly have it.
  en: { name: 'English', source: english, direction: 'ltr', formats: 'en-GB' },
  fr: { name: 'Français', source: french, direction: 'ltr', formats: 'fr' },
};

/** The language to begin with: the browser's first that we have, else English. */
export function preferredLanguage(wanted = navigator.languages) {
  const known = wanted.map((tag) => tag.slice(0, 2).toLowerCase()).find((tag) => tag in LANGUAGES);
  return known ?? 'en';
}

/**
 * @param {string} language a key of LANGUAGES
 */
export function wordsIn(language) {
  const { source, direction, formats: locale } = LANGUAGES[language];
  // No isolation marks: names from a register stand in elements of their own with dir="auto".
  const bundle = new FluentBundle(locale, { useIsolating: false });
  const faults = bundle.addResource(new FluentResource(source));
  if (faults.length) throw faults[0];

  /**
   * The sentence of a key. A key without a sentence is a defect, shown as the key itself.
   * @param {string} key
   * @param {Record<string, any>} [parameters]
   * @returns {string}
   */
  function say(key, parameters = {}) {
    const message = bundle.getMessage(key);
    if (!message?.value) {
      console.error(`no words for ${key} in ${language}`);
      return key;
    }
    const errors = [];
    const text = bundle.formatPattern(message.value, fluentValues(parameters), errors);
    if (errors.length) console.error(`${key} in ${language}: ${errors[0].message}`);
    return text;
  }

  const has = (key) => bundle.hasMessage(key);
  return { language, direction, say, has, ...formats(locale, say) };
}

/** Fluent takes strings and numbers; lists are joined, null is a dash. */
function fluentValues(parameters) {
  /** @type {Record<string, string|number>} */
  const values = {};
  for (const [name, value] of Object.entries(parameters)) {
    if (value === null || value === undefined) values[name] = '–';
    else if (Array.isArray(value)) values[name] = value.join(', ');
    else if (typeof value === 'boolean') values[name] = String(value);
    else values[name] = value;
  }
  return values;
}

/** Ways to write numbers; each takes null for "no number" and writes a dash. */
function formats(language, say) {
  const written = (options) => {
    const format = new Intl.NumberFormat(language, options);
    // A true minus sign, as wide as a figure.
    return (number) => (number === null || number === undefined ? '–' : format.format(number).replace('-', '\u2212'));
  };
  const fixed = (digits) => written({ minimumFractionDigits: digits, maximumFractionDigits: digits });
  const percentFormats = [0, 1, 2].map((digits) =>
    written({ style: 'percent', minimumFractionDigits: digits, maximumFractionDigits: digits }),
  );
  const decimals = [0, 1, 2, 3, 4].map(fixed);
  const dayFormat = new Intl.DateTimeFormat(language, { dateStyle: 'long', timeZone: 'UTC' });

  const count = decimals[0];
  const decimal = (number, digits = 2) => decimals[digits](number);
  const percent = (share, digits = 1) => percentFormats[digits](share);
  const signed = written({ minimumFractionDigits: 1, maximumFractionDigits: 1, signDisplay: 'exceptZero' });
  /** A difference of shares, in percentage points, with its sign. */
  const points = (difference) => (difference === null || difference === undefined ? '–' : signed(difference * 100));
  /** A ratio has three significant digits, so that 0.043 and 12.6 are both readable, and 1.70 stands beside 5.46. */
  const ratio = written({ minimumSignificantDigits: 3, maximumSignificantDigits: 3 });
  /** An amount that somebody chose, as it was chosen. */
  const amount = written({ maximumSignificantDigits: 6 });
  const day = (iso) => (iso ? dayFormat.format(new Date(`${iso}T00:00:00Z`)) : '–');
  const pValue = (p) => {
    if (p === null || p === undefined) return '–';
    return p < 0.001 ? `< ${decimals[3](0.001)}` : decimals[3](p);
  };
  /**
   * An estimate with its limits, "81.2 % (78.0 % to 84.1 %)"; one limit may be missing.
   * @param {{value: number|null, lower: number|null, upper: number|null} | null} estimate
   * @param {(number: number|null) => string} write how to write each number
   */
  const estimate = (estimate, write) => {
    if (!estimate || (estimate.value === null && estimate.lower === null)) return '–';
    const { value, lower, upper } = estimate;
    if (lower === null && upper === null) return write(value);
    return say('estimate', { value: write(value), lower: write(lower), upper: write(upper) });
  };
  const bytes = (size) => say('megabytes', { size: decimals[1](size / 1e6) });
  return { count, decimal, percent, points, ratio, amount, day, pValue, estimate, bytes };
}
