import type { Comparison } from '../shared/index.ts';
import { fontFiles, version } from './package-files.ts';

/** Draws every chart: SVG and the specification it was drawn from. */
const chartsOf = async (c: Comparison) => {
  const { chartSpecs, prepareFont, renderSvg } = await import('../charts/index.ts');
  const font = await prepareFont(fontFiles());
  const chartFiles: { name: string; title: string; altText: string; file: string }[] = [];
  const files = new Map<string, string>();
  for (const { name, title, altText, spec } of chartSpecs(c)) {
    const file = `charts/${name}.svg`;
    files.set(file, await renderSvg(spec, font));
    files.set(`charts/${name}.vl.json`, `${JSON.stringify(spec, null, 1)}\n`);
    chartFiles.push({ name, title, altText, file });
  }
  return { chartFiles, files };
};

/** All files of a report, path inside its folder → text. Nothing is written. */
export const reportContent = async (
  c: Comparison,
  checksums: readonly { readonly name: string; readonly sha256: string }[],
  withCharts: boolean,
): Promise<Map<string, string>> => {
  const { reportFiles } = await import('../report/index.ts');
  const charts = withCharts ? await chartsOf(c) : { chartFiles: [], files: new Map<string, string>() };
  return reportFiles(c, { version: version(), inputs: checksums, ...charts });
};
