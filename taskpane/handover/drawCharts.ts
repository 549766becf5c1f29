import type { PlannedChart, PlannedSeries } from './chartsBlock.ts';
import { ink, inkSoft, reading, rule, signal } from './looks.ts';

/**
 * Draws charts of the host's own kind, bound to cells.
 * @param over where each is to lie, top left and bottom right cell
 * @returns the charts' names
 */
export async function drawCharts(
  context: Excel.RequestContext,
  sheet: Excel.Worksheet,
  charts: readonly PlannedChart[],
  over: readonly (readonly [string, string])[],
  mark: string,
): Promise<string[]> {
  const names = charts.map((planned, k) => {
    const [first] = planned.series;
    const source = sheet.getRange(first?.y ?? 'A1');
    const chart = sheet.charts.add('XYScatter', source, 'Columns');
    chart.name = `${mark} ${k + 1}`;
    const [start = 'A1', end = 'H20'] = over[k] ?? [];
    chart.setPosition(start, end);
    chart.title.text = planned.title;
    chart.title.format.font.size = 11;
    chart.title.format.font.color = ink;
    chart.legend.visible = false;
    titleAxis(chart.axes.categoryAxis, planned.xTitle);
    titleAxis(chart.axes.valueAxis, planned.yTitle);
    planned.series.forEach((series, index) => {
      const drawn = index === 0 ? chart.series.getItemAt(0) : chart.series.add(series.name);
      drawSeries(sheet, drawn, series);
    });
    return `${mark} ${k + 1}`;
  });
  await context.sync();
  return names;
}

function titleAxis(axis: Excel.ChartAxis, text: string): void {
  axis.title.text = text;
  axis.title.format.font.color = inkSoft;
  axis.majorGridlines.format.line.color = rule;
  axis.format.font.color = inkSoft;
}

function drawSeries(
  sheet: Excel.Worksheet,
  drawn: Excel.ChartSeries,
  { name, x, y, look }: PlannedSeries,
): void {
  drawn.name = name;
  drawn.setXAxisValues(sheet.getRange(x));
  drawn.setValues(sheet.getRange(y));
  if (look === 'readings') {
    drawn.chartType = 'XYScatter';
    drawn.markerStyle = 'Circle';
    drawn.markerSize = 6;
    drawn.markerBackgroundColor = reading;
    drawn.markerForegroundColor = reading;
    return;
  }
  drawn.chartType = 'XYScatterLinesNoMarkers';
  drawn.markerStyle = 'None';
  drawn.format.line.color = signal;
  drawn.format.line.weight = look === 'line' ? 2 : 1;
  drawn.format.line.lineStyle = look === 'line' ? 'Continuous' : 'Dash';
}
