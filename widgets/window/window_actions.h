#pragma once

#include <QAction>
#include <QActionGroup>
#include <QObject>

namespace cornerwright {

/// Every command of the window, made once, so that bar, menus and shortcuts agree.
class WindowActions : public QObject {
    Q_OBJECT

  public:
    explicit WindowActions(QWidget* window);

    QAction* newProject;
    QAction* open;
    QAction* save;
    QAction* saveAs;
    QAction* printPane;
    QAction* addMeasurements;
    QAction* quit;

    QAction* undo;
    QAction* redo;
    QAction* addFormula;
    QAction* removeSection;
    QAction* switchSection;
    QAction* lockSection;

    QAction* hertz; ///< checkable: Hz rather than rad/s
    QAction* nextCase;
    QAction* previousCase;
    QAction* onlyShownCase;
    QAction* everyCase;
    QActionGroup* languageChoices; ///< system, English, German; each carries its code as data
    QActionGroup* grounds;         ///< system, light, dark; each carries its Ground as data
    QAction* wholePane;
    QAction* allPanes;

    QAction* keepTrial;
    QAction* showTrials;
    QAction* place;
    QAction* fitModel;
    QAction* showHandover;
    QAction* writeReport;

    QAction* explain;
    QAction* windowHelp;
    QAction* about;

    /// Enables and names undo and redo.
    void setUndo(bool can, const QString& what);
    void setRedo(bool can, const QString& what);

  private:
    void makeFileActions();
    void makeEditActions();
    void makeViewActions();
    void makeDesignActions();
    void makeHelpActions();
    QAction* make(const QString& text, const QKeySequence& keys, const QString& tip);

    QWidget* window_;
};

} // namespace cornerwright
