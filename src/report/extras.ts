/** What a report adds to the results: who wrote it, its charts, and proof of its inputs. */
export interface ReportExtras {
  /** Of trackworth. */
  readonly version: string;
  readonly chartFiles: readonly ChartFile[];
  readonly inputs: readonly { readonly name: string; readonly sha256: string }[];
  /** Files to put beside the memo: path inside the report folder → text, for example `charts/cost.svg`. */
  readonly files?: ReadonlyMap<string, string>;
}

export interface ChartFile {
  /** `cost` and `months` stand near the top of the memo, `skyline` beside the shading, the rest in the appendix. */
  readonly name: string;
  /** States the finding. */
  readonly title: string;
  /** What the chart shows, for those who cannot see it. */
  readonly altText: string;
  /** Path inside the report folder, for example `charts/cost.svg`. */
  readonly file: string;
}
