/** Most items an input of the computations may carry. */
export const hydraulicLimits = {
  readings: 500,
  floors: 20,
  pipes: 200,
  plugs: 200,
  lifts: 200,
  materials: 20,
  methods: 20,
  gaugeRows: 20,
} as const;
