import type { Trust } from '@/lib/brood/trust';

const PROGRAMME = 'programme default; owned by the lead biologist';
const RELATED = 'the form is read for related wasps and bees; the value for Polistes brood is not published';

/** What each number of the temperature model is, in which unit, and the values it may take. */
export const TEMPERATURE_RULES = {
  heatBase: { label: 'no development below', unit: '°C', min: 0, max: 20 },
  heatPlateau: { label: 'development no faster above', unit: '°C', min: 26, max: 40 },
  heatLimit: { label: 'no development and a heat warning above', unit: '°C', min: 34, max: 55 },
  heatShortGapHours: { label: 'longest gap of a logger that is filled by a line', unit: 'hours', min: 0, max: 24 },
  heatShortGapDays: { label: 'longest gap of daily extremes that is filled by a line', unit: 'days', min: 0, max: 7 },
  heatNightCurve: { label: 'hours drawn by 1 Linvill or 2 Parton and Logan', unit: '', min: 1, max: 2 },
} as const;

/** The name of one number of the temperature model. */
export type TemperatureSettingName = keyof typeof TEMPERATURE_RULES;

/** One number as the settings hold it. */
interface HeldNumber {
  value: number;
  trust: Trust;
  source: string;
}

const assumed = (value: number, source: string): HeldNumber => ({ value, trust: 'assumption', source });

/** What a new team starts with. */
export const DEFAULT_TEMPERATURE: Readonly<Record<TemperatureSettingName, HeldNumber>> = {
  heatBase: assumed(10, RELATED),
  heatPlateau: assumed(33, RELATED),
  heatLimit: assumed(42, RELATED),
  heatShortGapHours: assumed(3, PROGRAMME),
  heatShortGapDays: assumed(1, PROGRAMME),
  heatNightCurve: assumed(1, 'Linvill 1990 ends the night at the next minimum; Parton and Logan 1981 does not'),
};

/** Everything the development clock reads. */
export interface TemperatureSettings {
  /** °C below which nothing develops. */
  base: number;
  /** °C above which development is no faster. */
  plateau: number;
  /** °C above which nothing develops and a warning is due. */
  limit: number;
  /** °C at which a day counts as one day of the durations. */
  reference: number;
  shortGapHours: number;
  shortGapDays: number;
  curve: 'linvill' | 'parton-logan';
}

/**
 * The temperature part of a team's settings.
 *
 * @param values the settings' numbers; other names in it are not looked at.
 * @param referenceC the brood temperature that the taxon's durations refer to, °C.
 */
export function temperatureSettings(
  values: Readonly<Record<TemperatureSettingName, { value: number }>>,
  referenceC: number,
): TemperatureSettings {
  return {
    base: values.heatBase.value,
    plateau: values.heatPlateau.value,
    limit: values.heatLimit.value,
    reference: referenceC,
    shortGapHours: values.heatShortGapHours.value,
    shortGapDays: values.heatShortGapDays.value,
    curve: values.heatNightCurve.value === 2 ? 'parton-logan' : 'linvill',
  };
}
