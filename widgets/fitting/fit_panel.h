#pragma once

#include "widgets/fitting/fit_run.h"
#include "widgets/parts/panel_frame.h"

#include <optional>
#include <string>

class QCheckBox;
class QComboBox;
class QPushButton;
class QSpinBox;

namespace cornerwright {

class Document;
class QuantityField;
class ResponsePreview;
class TextLabel;
class ViewState;

/// A rational model for one measured case, in place of the work area: order and dead time found or
/// chosen, the model drawn over the measurement with its misfit. It enters the case only when the
/// person takes it, as one step.
class FitPanel : public PanelFrame {
    Q_OBJECT

  public:
    FitPanel(Document& document, ViewState& viewState, QWidget* parent = nullptr);

    /// Opens on a case and fits at once. Does nothing where the case has no measurement.
    bool open(std::size_t caseIndex);
    void startFit();
    /// Takes the shown model into the case.
    void take();
    void dismiss();

    bool isRunning() const { return run_.isRunning(); }
    const std::optional<FitResult>& result() const { return result_; }
    ResponsePreview& preview() const { return *preview_; }
    QSpinBox* orderBox() const { return order_; }
    QPushButton* takeButton() const { return take_; }

  Q_SIGNALS:
    void closed();
    void taken(const QString& sentence);
    /// Something that the panel shows is different now.
    void refreshed();

  protected:
    void keyPressEvent(QKeyEvent* event) override;

  private:
    void buildChoices();
    FitOptions options() const;
    std::shared_ptr<const MeasuredResponse> measured() const;
    std::optional<std::size_t> caseIndex() const;
    void show(const FitResult& result);
    void refresh();

    Document& document_;
    FitRun run_;
    std::string caseName_;
    std::optional<FitResult> result_;
    bool again_ = false; ///< another fit is wanted once the running one has stopped
    ResponsePreview* preview_;
    QSpinBox* order_;
    QComboBox* deadTimeChoice_;
    QuantityField* deadTime_;
    QCheckBox* stable_;
    TextLabel* words_;
    TextLabel* problem_;
    QPushButton* take_;
    QPushButton* cancel_;
};

} // namespace cornerwright
