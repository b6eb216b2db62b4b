import { gaugeValves } from '../holds/hold.states.js';
import { choice, instant, notNegative, number, optional, strict, temperatureF } from './field-kinds.js';

/** Gauge psi at an instant; with the gauge valve shut it shows the gauge and its hose alone. */
export const pressureReading = strict({
  at: instant,
  psi: number,
  temperatureF: optional(temperatureF),
  gaugeValve: choice(gaugeValves),
});

/** Inches from the rim down to the water at an instant. */
export const levelReading = strict({ at: instant, levelIn: notNegative, temperatureF: optional(temperatureF) });

/** The window that the test has to stand for, and the air in the house then: expected, coldest and hottest until then, °F. */
export const forecastRequest = strict({
  from: instant,
  to: instant,
  temperatureF: optional(temperatureF),
  coldestF: optional(temperatureF),
  hottestF: optional(temperatureF),
});
