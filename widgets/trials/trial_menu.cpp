#include "widgets/trials/trial_menu.h"

#include "widgets/trials/trial_book.h"

#include <QMenu>

namespace cornerwright {

void followTrials(QMenu& menu, TrialBook& book) {
    QObject::connect(&menu, &QMenu::aboutToShow, &book, [&menu, &book] {
        menu.clear();
        const auto add = [&](const QString& name, std::optional<std::size_t> index) {
            QAction* action = menu.addAction(name, &book, [&book, index] { book.compare(index); });
            action->setCheckable(true);
            action->setChecked(book.compared() == index);
        };
        add(TrialBook::tr("compare with none"), std::nullopt);
        for (std::size_t i = 0; i < book.trials().size(); ++i) {
            add(book.trials()[i].name, i);
        }
    });
}

} // namespace cornerwright
