/** The part of a round plan that a results file is checked against. The caller reads it from the database. */
export type ResultsPlan = {
  /** The round's code or name, as it stands in messages. */
  round: string;
  items: readonly PlanItem[];
  measurands: readonly PlanMeasurand[];
  /** The codes of the laboratory's method sheets; null: methods are not checked. */
  methods: readonly string[] | null;
  /** Only for a whole round: the laboratories that the provider knows. */
  laboratories?: readonly PlanLaboratory[];
};

export type PlanItem = { code: string; name: string };

/** One measurand of one test item. */
export type PlanMeasurand = {
  roundMeasurandId: number;
  /** Code of the test item, as printed on the label. */
  item: string;
  /** Code of the measurand in the round plan. */
  measurand: string;
  name: string;
  /** UCUM code. A unit that lib/units does not know is taken when a file repeats it letter by letter. */
  unit: string;
  /** How many replicates the plan asks for, 1 or more. */
  replicates: number;
};

export type PlanLaboratory = { id: number; name: string; code?: string };
