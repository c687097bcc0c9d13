#include "widgets/import/column_table.h"

#include "widgets/theme.h"

#include <QComboBox>
#include <QHeaderView>

#include <algorithm>

namespace cornerwright {

namespace {

constexpr int meaningRow = 0;
constexpr int unitRow = 1;
constexpr int choiceRows = 2;

struct NamedMeaning {
    const char* name; ///< as the reader knows it
    QString shown;
    QStringList units;
};

const std::vector<NamedMeaning>& meanings() {
    static const std::vector<NamedMeaning> all{
        {"frequency",
         ColumnTable::tr("Frequency"),
         {QStringLiteral("mHz"), QStringLiteral("Hz"), QStringLiteral("kHz"), QStringLiteral("MHz"),
          QStringLiteral("GHz"), QStringLiteral("rad/s"), QStringLiteral("krad/s")}},
        {"magnitude",
         ColumnTable::tr("Magnitude"),
         {QStringLiteral("dB"), QStringLiteral("linear")}},
        {"phase", ColumnTable::tr("Phase"), {QStringLiteral("deg"), QStringLiteral("rad")}},
        {"real", ColumnTable::tr("Real part"), {}},
        {"imaginary", ColumnTable::tr("Imaginary part"), {}},
        {"coherence", ColumnTable::tr("Coherence"), {}},
        {"unused", ColumnTable::tr("Not used"), {}},
    };
    return all;
}

QStringList unitsOf(const QString& meaning) {
    const auto found = std::ranges::find_if(meanings(), [&meaning](const NamedMeaning& known) {
        return meaning == QLatin1String(known.name);
    });
    return found == meanings().end() ? QStringList() : found->units;
}

ColourRole roleOf(RawLine::Role role) {
    return role == RawLine::Role::row || role == RawLine::Role::heading ? ColourRole::ink
                                                                        : ColourRole::muted;
}

} // namespace

ColumnTable::ColumnTable(QWidget* parent) : QTableWidget(parent) {
    setAccessibleName(tr("The file as it stands, and what each column means"));
    setEditTriggers(NoEditTriggers);
    setSelectionMode(NoSelection);
    setFocusPolicy(Qt::ClickFocus);
    setWordWrap(false);
    horizontalHeader()->setDefaultAlignment(Qt::AlignLeft | Qt::AlignVCenter);
    verticalHeader()->setDefaultAlignment(Qt::AlignRight | Qt::AlignVCenter);
}

QComboBox* ColumnTable::meaningBox(int column) const {
    return qobject_cast<QComboBox*>(cellWidget(meaningRow, column - 1));
}

QComboBox* ColumnTable::unitBox(int column) const {
    return qobject_cast<QComboBox*>(cellWidget(unitRow, column - 1));
}

void ColumnTable::setLook(const ImportLook& look, ImportChoices::Holds holds) {
    const std::vector<RawLine>& lines = look.preview.lines;
    std::size_t fields = 1;
    for (const RawLine& line : lines) {
        fields = std::max(fields, line.fields.size());
    }
    const bool choosable = look.preview.kind == Preview::Kind::text_table &&
                           holds == ImportChoices::Holds::response && !look.preview.time_record;
    const int firstRow = choosable ? choiceRows : 0;
    clear();
    setColumnCount(static_cast<int>(fields));
    setRowCount(firstRow + static_cast<int>(lines.size()));
    QStringList numbers;
    for (std::size_t i = 1; i <= fields; ++i) {
        numbers << tr("Column %1").arg(i);
    }
    setHorizontalHeaderLabels(numbers);
    showLines(lines, firstRow);
    const int lineHeight = fontMetrics().height() + 4;
    for (int row = firstRow; row < rowCount(); ++row) {
        setRowHeight(row, lineHeight);
    }
    if (choosable) {
        showChoices(look);
    }
    resizeColumnsToContents();
}

void ColumnTable::showLines(const std::vector<RawLine>& lines, int firstRow) {
    const Theme& theme = Theme::of(palette());
    clearSpans();
    for (std::size_t i = 0; i < lines.size(); ++i) {
        const RawLine& line = lines[i];
        const int row = firstRow + static_cast<int>(i);
        setVerticalHeaderItem(row, new QTableWidgetItem(QString::number(line.line)));
        for (std::size_t k = 0; k < line.fields.size(); ++k) {
            auto* item = new QTableWidgetItem(QString::fromStdString(line.fields[k]));
            item->setForeground(theme.colour(roleOf(line.role)));
            if (line.role == RawLine::Role::heading) {
                item->setFont(fontOf(FontRole::strong));
            }
            setItem(row, static_cast<int>(k), item);
        }
        if (line.fields.size() == 1 && columnCount() > 1) {
            setSpan(row, 0, 1, columnCount());
        }
    }
}

void ColumnTable::showChoices(const ImportLook& look) {
    setVerticalHeaderItem(meaningRow, new QTableWidgetItem(tr("means")));
    setVerticalHeaderItem(unitRow, new QTableWidgetItem(tr("in")));
    for (int column = 1; column <= columnCount(); ++column) {
        const auto known = std::ranges::find(look.preview.columns, column, &ColumnInfo::column);
        const bool found = known != look.preview.columns.end();
        const QString meaning =
            found ? QString::fromStdString(known->meaning) : QStringLiteral("unused");
        const bool open =
            std::ranges::any_of(look.preview.choices, [column](const OpenChoice& choice) {
                return choice.column == column || choice.column == 0;
            });
        auto* box = new QComboBox(this);
        box->setAccessibleName(tr("What column %1 means").arg(column));
        for (const NamedMeaning& each : meanings()) {
            box->addItem(each.shown, QString::fromLatin1(each.name));
        }
        box->setCurrentIndex(box->findData(meaning));
        setCellWidget(meaningRow, column - 1, box);
        connect(box, &QComboBox::activated, this, [this, column] {
            fillUnits(column, meaningBox(column)->currentData().toString(), QString(), false);
            tell(column);
        });
        auto* units = new QComboBox(this);
        units->setAccessibleName(tr("Unit of column %1").arg(column));
        setCellWidget(unitRow, column - 1, units);
        connect(units, &QComboBox::activated, this, [this, column] { tell(column); });
        fillUnits(column, meaning, found ? QString::fromStdString(known->unit) : QString(), open);
    }
}

void ColumnTable::fillUnits(int column, const QString& meaning, const QString& unit, bool open) {
    QComboBox* box = unitBox(column);
    const QStringList units = unitsOf(meaning);
    box->clear();
    // What the file leaves open stands as a question until it is answered.
    box->addItem(open && unit.isEmpty() ? tr("? choose") : tr("as the heading says"), QString());
    for (const QString& each : units) {
        box->addItem(each, each);
    }
    box->setCurrentIndex(std::max(0, box->findData(unit)));
    box->setEnabled(!units.isEmpty());
}

void ColumnTable::tell(int column) {
    Q_EMIT columnChosen(column, meaningBox(column)->currentData().toString(),
                        unitBox(column)->currentData().toString());
}

} // namespace cornerwright
