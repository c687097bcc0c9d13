#pragma once

#include <QObject>
#include <QStringList>

#include <cstddef>

class QStackedWidget;

namespace cornerwright {

class Document;
class FitPanel;
class ImportPanel;
class NoticeStrip;
class ViewState;

/// Measurements on their way in and models fitted to them: the two panels that take the place of
/// the work area, and the way back from them.
class MeasurementFlow : public QObject {
    Q_OBJECT

  public:
    MeasurementFlow(Document& document, ViewState& viewState, NoticeStrip& notices,
                    QStackedWidget& pages, QObject* parent);

    void takeIn(const QStringList& paths);
    void fit(std::size_t caseIndex);

    ImportPanel& importPanel() const { return *import_; }
    FitPanel& fitPanel() const { return *fit_; }

  private:
    void tell(const QString& sentence);
    void goBack();

    Document& document_;
    ViewState& viewState_;
    NoticeStrip& notices_;
    QStackedWidget& pages_;
    ImportPanel* import_;
    FitPanel* fit_;
};

} // namespace cornerwright
