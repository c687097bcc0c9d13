#include "widgets/panes/csv_table.h"

#include <array>
#include <charconv>
#include <cmath>

namespace cornerwright {

namespace {

QString field(QString name) {
    const bool mustQuote = name.contains(QLatin1Char(',')) || name.contains(QLatin1Char('"')) ||
                           name.contains(QLatin1Char('\n'));
    if (!mustQuote)
        return name;
    name.replace(QLatin1Char('"'), QStringLiteral("\"\""));
    return QLatin1Char('"') + name + QLatin1Char('"');
}

QString field(double number) {
    if (std::isnan(number))
        return {};
    std::array<char, 32> buffer{};
    const auto end = std::to_chars(buffer.data(), buffer.data() + buffer.size(), number).ptr;
    return QString::fromLatin1(buffer.data(), end - buffer.data());
}

} // namespace

CsvTable::CsvTable(const QStringList& header) {
    QStringList fields;
    for (const QString& name : header)
        fields.append(field(name));
    text_ = fields.join(QLatin1Char(',')) + QLatin1Char('\n');
}

void CsvTable::addRow(std::initializer_list<QString> names, std::initializer_list<double> numbers) {
    QStringList fields;
    for (const QString& name : names)
        fields.append(field(name));
    for (const double number : numbers)
        fields.append(field(number));
    text_ += fields.join(QLatin1Char(',')) + QLatin1Char('\n');
}

} // namespace cornerwright
