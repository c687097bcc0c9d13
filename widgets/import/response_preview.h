#pragma once

#include "core/response/measured_response.h"
#include "widgets/panes/plot_canvas.h"

#include <QPen>
#include <QWidget>

#include <memory>
#include <vector>

namespace cornerwright {

class ViewState;

/// One response as magnitude (dB) and unwrapped phase (degrees) over frequency.
struct PreviewCurve {
    std::vector<double> w_rad_s;
    std::vector<double> db;
    std::vector<double> degrees;
    bool isModel = false; ///< drawn as a line; a measurement is drawn as its points
};

PreviewCurve previewCurve(const MeasuredResponse& measured);

/// Magnitude above phase, with a common frequency axis. It fits itself to what it shows.
class ResponsePreview : public QWidget {
    Q_OBJECT

  public:
    explicit ResponsePreview(ViewState& viewState, QWidget* parent = nullptr);

    void setCurves(std::vector<PreviewCurve> curves);
    const std::vector<PreviewCurve>& curves() const { return curves_; }

  protected:
    void changeEvent(QEvent* event) override;

  private:
    void draw(QPainter& painter, const PlotCanvas& canvas,
              std::vector<double> PreviewCurve::*values) const;
    void fitTo(PlotCanvas& canvas, std::vector<double> PreviewCurve::*values, double smallest);
    void redraw();

    ViewState& viewState_;
    std::vector<PreviewCurve> curves_;
    std::unique_ptr<PlotCanvas> magnitude_;
    std::unique_ptr<PlotCanvas> phase_;
};

} // namespace cornerwright
