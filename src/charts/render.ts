import type { LoggerInterface } from 'vega';
import type { FontMetrics } from './font.ts';
import type { VegaLiteSpec } from './frame.ts';

/** What Vega says of a text that it wants measured. */
interface TextItem {
  fontSize?: number | null;
  fontWeight?: string | number | null;
}

/** Vega counts clip ids and keeps its text measure in one place for all charts, so charts are drawn one after another. */
let last: Promise<unknown> = Promise.resolve();

/**
 * Draws a specification as SVG, the same bytes on every run and machine. Reads no file and no network. Vega is
 * loaded on the first call.
 * @param font from `prepareFont`; without real widths Vega guesses them a third too wide
 * @throws Error with all warnings of Vega-Lite and Vega, if there are any
 */
export const renderSvg = (spec: VegaLiteSpec, font: FontMetrics): Promise<string> => {
  const drawn = last.then(() => draw(spec, font));
  last = drawn.catch(() => undefined);
  return drawn;
};

const draw = async (spec: VegaLiteSpec, font: FontMetrics): Promise<string> => {
  const [vega, { compile }] = await Promise.all([import('vega'), import('vega-lite')]);
  const warnings: string[] = [];
  const logger = collector(warnings);
  // Both hooks are public in Vega's scene graph but absent from its types.
  const hooks = vega as unknown as {
    textMetrics: { width: (item: TextItem, text: unknown) => number };
  };
  hooks.textMetrics.width = (item, text) =>
    font.width(String(text ?? '').trim(), item.fontSize ?? 11, isBold(item.fontWeight));
  vega.resetSVGDefIds();
  const refuse = () => Promise.reject(new Error('charts load nothing from outside'));
  const loader = { load: refuse, sanitize: refuse, http: refuse, file: refuse, options: {} };
  const compiled = compile(spec as unknown as Parameters<typeof compile>[0], { logger }).spec;
  const view = new vega.View(vega.parse(compiled), { renderer: 'none', loader, logger });
  try {
    const svg = await view.toSVG();
    if (warnings.length > 0) throw new Error(`Vega warned: ${warnings.join('; ')}`);
    return shortPaths(svg);
  } finally {
    view.finalize();
  }
};

const isBold = (weight: TextItem['fontWeight']): boolean => weight === 'bold' || Number(weight) >= 600;

const collector = (warnings: string[]): LoggerInterface => {
  // Setting a level gives the logger back, asking for it gives the level: warnings and up.
  function level(_: number): LoggerInterface;
  function level(): number;
  function level(set?: number): number | LoggerInterface {
    return set === undefined ? 2 : logger;
  }
  const keep = (...parts: readonly unknown[]) => {
    warnings.push(parts.map(String).join(' '));
    return logger;
  };
  const logger: LoggerInterface = {
    level,
    error: keep,
    warn: keep,
    info: () => logger,
    debug: () => logger,
  };
  return logger;
};

/** Coordinates to a hundredth of a pixel: a third of the size, and no last digit that could differ between machines. */
const shortPaths = (svg: string): string =>
  svg.replace(/<(?:path|g|text|line|rect)\b[^>]*>/g, (tag) =>
    tag.replace(/ (d|transform|x|y|x1|x2|y1|y2|width|height)="([^"]*)"/g, (_, name: string, value: string) =>
      ` ${name}="${value.replace(/-?\d+\.\d{3,}(?:e-?\d+)?/g, (n) => String(Number(Number(n).toFixed(2)) + 0))}"`,
    ),
  ); // biome-ignore format: attribute by attribute
