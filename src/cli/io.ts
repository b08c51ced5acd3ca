/** The world as a command sees it: injected, so that tests run commands without leaving their process. */
export interface Io {
  /** Folder that relative paths start from. */
  readonly cwd: string;
  /** True where the user asked for the stack of an unexpected error. */
  readonly debug: boolean;
  /** Data: standard output. */
  out(text: string): void;
  /** Messages: standard error. */
  err(text: string): void;
}
