#pragma once

#include "widgets/import/import_look.h"

#include <QTableWidget>

#include <vector>

class QComboBox;

namespace cornerwright {

/// The first lines of a file as they stand; above them, for a text table, what each column was
/// taken for, to be corrected by choosing another meaning or unit.
class ColumnTable : public QTableWidget {
    Q_OBJECT

  public:
    explicit ColumnTable(QWidget* parent = nullptr);

    void setLook(const ImportLook& look, ImportChoices::Holds holds);
    QComboBox* meaningBox(int column) const;
    QComboBox* unitBox(int column) const;

  Q_SIGNALS:
    /// The person says what a column (from 1) means; the unit is empty where the heading has it.
    void columnChosen(int column, const QString& meaning, const QString& unit);

  private:
    void showLines(const std::vector<RawLine>& lines, int firstRow);
    void showChoices(const ImportLook& look);
    void fillUnits(int column, const QString& meaning, const QString& unit, bool open);
    void tell(int column);
};

} // namespace cornerwright
