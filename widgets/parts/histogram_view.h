#pragma once

#include <QString>
#include <QWidget>

#include <functional>
#include <optional>
#include <span>
#include <vector>

namespace cornerwright {

/// Values counted in bars of equal width.
struct Histogram {
    double low = 0.0;
    double width = 1.0;
    std::vector<int> counts;
};

/// As many bars as the root of the number of values, from 6 to 40: common practice, no source.
/// Infinite values are left out; none gives no bars.
Histogram histogramOf(std::span<const double> values);

/// Bars with a scale below and, where asked, a line at a limit. Left and right keys walk the bars
/// and tell each in words.
class HistogramView : public QWidget {
    Q_OBJECT

  public:
    explicit HistogramView(QWidget* parent = nullptr);

    /// Writes a value with its unit.
    using Text = std::function<QString(double)>;
    void setValues(std::span<const double> values, std::optional<double> limit, Text text);
    const Histogram& histogram() const { return histogram_; }
    /// "12 from 41.2° to 43.0°" of the bar told last; empty if none.
    QString told() const { return told_; }

    QSize minimumSizeHint() const override;

  protected:
    void paintEvent(QPaintEvent* event) override;
    void mouseMoveEvent(QMouseEvent* event) override;
    void keyPressEvent(QKeyEvent* event) override;
    void focusInEvent(QFocusEvent* event) override;
    void focusOutEvent(QFocusEvent* event) override;

  private:
    QRectF area() const;
    double pixelOf(double value) const;
    void tell(int bar);

    Histogram histogram_;
    std::optional<double> limit_;
    Text text_;
    QString told_;
    int bar_ = -1;
};

} // namespace cornerwright
