#pragma once

#include "widgets/panes/plot_pane.h"

namespace cornerwright {

/// The closed-loop poles as the loop gain goes from 0 up, in rad/s, with the roots of plant
/// (graphite) and compensator (colours of their sections). Compensator roots are dragged in the
/// plane, a closed-loop pole along its branch for the gain.
class RootLocusPane : public PlotPane {
    Q_OBJECT

  public:
    explicit RootLocusPane(ViewState& viewState, QWidget* parent = nullptr);

    QString title() const override { return tr("Root locus"); }
    QString csv() const override;

  protected:
    void contentChanged() override;
    std::optional<PlotRanges> fittedRanges() const override;
    void drawCurves(QPainter& painter) override;
    void drawMarks(QPainter& painter) override;
    std::vector<Handle> makeHandles() const override;
    std::optional<Project> dragged(const HandleId& handle, const DragMotion& motion,
                                   const Project& start) const override;
    std::optional<Project> nudged(const HandleId& handle, const QPointF& direction, double share,
                                  const Project& project) const override;
    void dragBegins(const HandleId& handle) override;
    void mouseAt(const QPointF& pixel) override;
    void mouseLeft() override;
    bool zoomsBothAxes() const override { return true; }

  private:
    QPointF toPixel(Complex s) const;
    Complex toPlane(const QPointF& pixel) const;
    /// Index of the factor 1 of the locus.
    static std::optional<std::size_t> present(const RootLocus& locus);
    void drawDampingRays(QPainter& painter) const;
    void drawPlantRoots(QPainter& painter) const;
    void drawCrossings(QPainter& painter) const;
    void drawRoot(QPainter& painter, const QPointF& at, bool isZero, const QColor& colour,
                  double size) const;
    void drawDrop(QPainter& painter, std::size_t branch, double size) const;
    void drawBranches(QPainter& painter, const RootLocus& locus, const QPen& pen) const;
    /// The linked cursor is the half circle |s| = w; under the mouse also s and its damping.
    void drawCursor(QPainter& painter) const;

    std::optional<Complex> underMouse_;
    std::shared_ptr<const RootLocus> ghost_;      ///< at the start of anybody's drag
    std::shared_ptr<const RootLocus> startLocus_; ///< of the running drag
};

} // namespace cornerwright
