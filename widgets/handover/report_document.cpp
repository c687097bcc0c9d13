#include "widgets/handover/report_document.h"

#include <QAbstractTextDocumentLayout>
#include <QBuffer>
#include <QPageLayout>
#include <QPainter>
#include <QPdfWriter>
#include <QSvgRenderer>
#include <QTextDocument>
#include <QTextObjectInterface>

#include <algorithm>
#include <memory>
#include <vector>

namespace cornerwright {

namespace {

constexpr double pixelsPerInch = 96.0; // of CSS
constexpr int dotsPerInch = 600;
constexpr double textWidth = 170.0 / 25.4; // inches: A4 less 2 cm on either side
constexpr double bodyPoints = 9.0;

/// What the style sheet of the page says, in the units and words that a paginated document knows.
const char* const printedStyle =
    "h1{font-size:17pt}h2{font-size:12pt;margin-top:24px;margin-bottom:6px}"
    "p{margin-top:4px;margin-bottom:6px}"
    "th{color:#6B6F76;font-weight:normal;text-align:left}"
    "code{font-size:7pt}"
    ".verdict{font-size:11pt}.met{color:#00785A}.unmet{color:#C2410C}.open{color:#6B6F76}";

/// Draws the images of a document, which are plots by number, as vectors.
class PlotImages : public QObject, public QTextObjectInterface {
    Q_OBJECT
    Q_INTERFACES(QTextObjectInterface)

  public:
    int add(const std::string& svg) {
        plots_.push_back(std::make_unique<QSvgRenderer>(QByteArray::fromStdString(svg), nullptr));
        return static_cast<int>(plots_.size()) - 1;
    }

    QSizeF intrinsicSize(QTextDocument* document, int, const QTextFormat& format) override {
        const QSizeF size = plotOf(format).defaultSize();
        const QPaintDevice* device = document->documentLayout()->paintDevice();
        const double dots = device == nullptr ? pixelsPerInch : device->logicalDpiX();
        return size * std::min(dots / pixelsPerInch, textWidth * dots / size.width());
    }

    void drawObject(QPainter* painter, const QRectF& area, QTextDocument*, int,
                    const QTextFormat& format) override {
        plotOf(format).render(painter, area);
    }

  private:
    QSvgRenderer& plotOf(const QTextFormat& format) const {
        return *plots_[format.toImageFormat().name().toUInt()];
    }

    std::vector<std::unique_ptr<QSvgRenderer>> plots_;
};

/// Tables as a paginated document draws them: rules between the rows, the whole width.
QString withPrintedTables(QString markup) {
    return markup.replace(
        QStringLiteral("<table>"),
        QStringLiteral("<table width=\"100%\" cellspacing=\"0\" cellpadding=\"3\" "
                       "border=\"1\" style=\"border-collapse:collapse;"
                       "border-color:#DEDBD3;font-size:7.5pt\">"));
}

QString markupOf(const ReportInput& input, PlotImages& plots) {
    QString markup;
    for (const ReportPart& part : review_report(input)) {
        markup += withPrintedTables(QString::fromStdString(part.markup));
        if (!part.svg.empty()) {
            markup += QStringLiteral("<p><img src=\"%1\"></p>").arg(plots.add(part.svg));
        }
    }
    return markup;
}

/// The clock has no place in a file that must come out the same again.
void removeDate(QByteArray& pdf) {
    const QByteArray key("/CreationDate (");
    const qsizetype begin = pdf.indexOf(key);
    const qsizetype end = begin < 0 ? begin : pdf.indexOf(')', begin);
    if (end >= 0) {
        for (qsizetype i = begin; i <= end; ++i) {
            pdf[i] = ' '; // as many bytes as before: the table of offsets stays right
        }
    }
}

} // namespace

QByteArray reportPdf(const ReportInput& input) {
    PlotImages plots;
    QTextDocument document;
    QFont font;
    font.setFamilies({QStringLiteral("Inter"), QStringLiteral("DejaVu Sans")});
    font.setPointSizeF(bodyPoints);
    document.setDefaultFont(font);
    document.setDefaultStyleSheet(QString::fromLatin1(printedStyle));
    document.setHtml(markupOf(input, plots));
    document.documentLayout()->registerHandler(QTextFormat::ImageObject, &plots);

    QByteArray pdf;
    QBuffer buffer(&pdf);
    buffer.open(QIODevice::WriteOnly);
    {
        QPdfWriter writer(&buffer);
        writer.setTitle(QString::fromStdString(input.project->title));
        writer.setResolution(dotsPerInch);
        // The document leaves its own margin of 2 cm.
        writer.setPageLayout(
            QPageLayout(QPageSize(QPageSize::A4), QPageLayout::Portrait, QMarginsF()));
        document.print(&writer);
    }
    removeDate(pdf);
    return pdf;
}

} // namespace cornerwright

#include "report_document.moc"
