#pragma once

#include <QPen>
#include <QString>
#include <QWidget>

#include <functional>
#include <vector>

class QHBoxLayout;

namespace cornerwright {

/// Samples of the pens of a pane with their names, and the pane's switches, for its head.
class LegendWidget : public QWidget {
    Q_OBJECT

  public:
    struct Entry {
        QString name;
        QPen pen;

        bool operator==(const Entry&) const = default;
    };

    explicit LegendWidget(QWidget* parent);

    void setEntries(std::vector<Entry> entries);
    const std::vector<Entry>& entries() const { return entries_; }
    /// A small button that shows and follows a checkable action.
    void addSwitch(QAction* action);

  private:
    class Samples;
    std::vector<Entry> entries_;
    Samples* samples_;
    QHBoxLayout* row_;
};

} // namespace cornerwright
