export interface DemoSignIn {
  role: string;
  name: string;
  email: string;
  password: string;
}

export interface DemoToken {
  laboratory: string;
  /** The round as it stands in addresses. */
  round: string;
  /** An item and a measurand that the laboratory may report in it. */
  item: string;
  measurand: string;
  token: string;
}

export interface Demo {
  signIns: DemoSignIn[];
  tokens: DemoToken[];
  /** The round that takes results, as it stands in addresses. */
  openRound: string | null;
  /** True when this call seeded it. */
  seeded: boolean;
}

export function makeDataFolder(folder: string): boolean;
export function migrate(dataDir: string): Promise<string>;
export function hasSeeds(): boolean;
export function seed(dataDir: string): Promise<Demo>;
