package org.flexbound.report.workbook;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.apache.poi.ss.util.CellRangeAddress;
import org.apache.poi.xddf.usermodel.chart.AxisPosition;
import org.apache.poi.xddf.usermodel.chart.ChartTypes;
import org.apache.poi.xddf.usermodel.chart.LegendPosition;
import org.apache.poi.xddf.usermodel.chart.MarkerStyle;
import org.apache.poi.xddf.usermodel.chart.ScatterStyle;
import org.apache.poi.xddf.usermodel.chart.XDDFDataSourcesFactory;
import org.apache.poi.xddf.usermodel.chart.XDDFNumericalDataSource;
import org.apache.poi.xddf.usermodel.chart.XDDFScatterChartData;
import org.apache.poi.xddf.usermodel.chart.XDDFValueAxis;
import org.apache.poi.xssf.usermodel.XSSFChart;
import org.apache.poi.xssf.usermodel.XSSFClientAnchor;
import org.apache.poi.xssf.usermodel.XSSFDrawing;
import org.apache.poi.xssf.usermodel.XSSFSheet;
import org.apache.poi.xssf.usermodel.XSSFWorkbook;
import org.flexbound.report.UnitSystem;
import org.flexbound.report.figures.XmlText;
import org.flexbound.report.results.Curve;
import org.flexbound.report.results.CurvePoint;
import org.flexbound.report.results.Results;

/** The readings that the fits used, step by step, and charts of them that belong to the workbook. */
final class ReadingsSheet {
  private static final int CHARTS_BESIDE = 3;
  private static final int CHART_COLUMNS = 8;
  private static final int CHART_ROWS = 20;

  /** More charts than this make a spreadsheet program slow; the report has them all. */
  private static final int MOST_CHARTS = 60;

  private final XSSFWorkbook workbook;
  private final Styles styles;
  private final UnitSystem units;

  ReadingsSheet(XSSFWorkbook workbook, Styles styles, UnitSystem units) {
    this.workbook = workbook;
    this.styles = styles;
    this.units = units;
  }

  /** Rows of a curve in the sheet, both included, from 0. */
  private record Stretch(Curve curve, int first, int last) {}

  void write(Results results) {
    SheetWriter sheet =
        new SheetWriter(
            workbook, styles, "Readings used", "Configuration", "Run", "Gauge", "Load", "Branch",
            "Cycle", "Used", "Load reading", "Load unit", "Motion", "Motion unit", "Residual",
            "Where");
    Map<String, List<Stretch>> charts = new LinkedHashMap<>();
    for (Curve c : results.curves()) {
      int first = sheet.rows();
      for (CurvePoint p : c.points()) {
        sheet.row(
            c.configuration(), c.run(), c.gauge(), c.load(), p.branch(), p.cycle(), p.used(),
            units.shown(p.load(), c.loadUnit()), units.symbol(c.loadUnit()),
            units.shown(p.motion(), c.motionUnit()), units.symbol(c.motionUnit()),
            units.shown(p.residual(), c.motionUnit()), p.where());
      }
      if (sheet.rows() > first) {
        charts
            .computeIfAbsent(
                c.gauge() + " / " + c.load()
                    + (results.configurations().size() > 1 ? ", " + c.configuration() : ""),
                unused -> new ArrayList<>())
            .add(new Stretch(c, first, sheet.rows() - 1));
      }
    }
    sheet.finish();
    if (!charts.isEmpty()) {
      draw(sheet.sheet(), charts);
    }
  }

  private void draw(XSSFSheet data, Map<String, List<Stretch>> charts) {
    XSSFSheet sheet = workbook.createSheet("Charts");
    XSSFDrawing drawing = sheet.createDrawingPatriarch();
    int number = 0;
    for (Map.Entry<String, List<Stretch>> entry : charts.entrySet()) {
      if (number >= MOST_CHARTS) {
        break;
      }
      int column = number % CHARTS_BESIDE * (CHART_COLUMNS + 1);
      int row = number / CHARTS_BESIDE * (CHART_ROWS + 1);
      XSSFClientAnchor anchor =
          drawing.createAnchor(
              0, 0, 0, 0, column, row, column + CHART_COLUMNS, row + CHART_ROWS);
      chart(drawing.createChart(anchor), data, entry.getKey(), entry.getValue());
      number++;
    }
  }

  private void chart(XSSFChart chart, XSSFSheet data, String title, List<Stretch> stretches) {
    Curve first = stretches.get(0).curve();
    chart.setTitleText(XmlText.clean(title));
    chart.setTitleOverlay(false);
    chart.getOrAddLegend().setPosition(LegendPosition.BOTTOM);
    XDDFValueAxis x = chart.createValueAxis(AxisPosition.BOTTOM);
    x.setTitle("load, " + units.symbol(first.loadUnit()));
    XDDFValueAxis y = chart.createValueAxis(AxisPosition.LEFT);
    y.setTitle("motion, " + units.symbol(first.motionUnit()));
    XDDFScatterChartData scatter =
        (XDDFScatterChartData) chart.createData(ChartTypes.SCATTER, x, y);
    scatter.setStyle(ScatterStyle.LINE_MARKER);
    for (Stretch stretch : stretches) {
      XDDFNumericalDataSource<Double> loads = column(data, stretch, 7);
      XDDFNumericalDataSource<Double> motions = column(data, stretch, 9);
      XDDFScatterChartData.Series series =
          (XDDFScatterChartData.Series) scatter.addSeries(loads, motions);
      series.setTitle(XmlText.clean(stretch.curve().run()), null);
      series.setSmooth(false);
      series.setMarkerStyle(MarkerStyle.CIRCLE);
    }
    chart.plot(scatter);
  }

  private static XDDFNumericalDataSource<Double> column(
      XSSFSheet data, Stretch stretch, int column) {
    return XDDFDataSourcesFactory.fromNumericCellRange(
        data, new CellRangeAddress(stretch.first(), stretch.last(), column, column));
  }
}
