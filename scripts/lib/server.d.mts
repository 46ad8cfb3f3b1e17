export interface Server {
  pid: number;
  baseUrl: string;
  logFile?: string;
  /** Resolves with the exit code. */
  exited: Promise<number>;
  /** Ends the server at once, as a crash would. */
  kill(): Promise<number>;
  /** Lets the server finish what it is doing. */
  stop(): Promise<number>;
}

export interface ServerOptions {
  dataDir: string;
  host?: string;
  port?: number;
  /** Added to the environment; undefined takes a variable away. */
  env?: Record<string, string | undefined>;
  logFile?: string;
  dir?: string;
  /** Path that answers with 200 once the server is ready; default /api/health. */
  health?: string;
}

export function startServer(options: ServerOptions): Promise<Server>;
export function freePort(): Promise<number>;
export function answers(url: string): Promise<boolean>;
