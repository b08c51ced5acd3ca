/** How a plain table's columns are called, and in which unit each stands. */
export interface TableColumn {
  readonly name: string;
  /** As written in the study, for example `W/m2`, `kJ/m2`, `degF`, `mph`; null: the documented unit. */
  readonly unit: string | null;
}

export interface TableColumns {
  /** Local time without a zone: ISO 8601 (`2021-01-01 00:00`, `2021-01-01T01:00`), `31.01.2021 01:00`, or with slashes. */
  readonly time: TableColumn;
  readonly ghi: TableColumn | null;
  readonly dni: TableColumn | null;
  readonly dhi: TableColumn | null;
  readonly temperature: TableColumn | null;
  readonly wind: TableColumn | null;
}
