#pragma once

#include <QString>
#include <QStringList>

#include <initializer_list>
#include <span>

namespace cornerwright {

/// Rows of comma-separated values with a header; numbers in shortest round-trip form, names quoted
/// where they must be (RFC 4180). What is not known (NaN) is an empty field.
class CsvTable {
  public:
    explicit CsvTable(const QStringList& header);

    void addRow(std::initializer_list<QString> names, std::initializer_list<double> numbers);
    QString text() const { return text_; }

  private:
    QString text_;
};

} // namespace cornerwright
