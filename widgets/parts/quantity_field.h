#pragma once

#include "widgets/parts/quantity.h"

#include <QLineEdit>

#include <functional>
#include <optional>

namespace cornerwright {

/// A number that can be typed exactly, unit included ("12 Hz"). At rest it shows few digits; with
/// the focus it shows the exact value. Enter takes the text, Escape puts the value back, the up and
/// down keys move it by 1 % (with shift by 0.1 %). What cannot be taken is said in `problemChanged`
/// and the text stays for correction.
class QuantityField : public QLineEdit {
    Q_OBJECT

  public:
    QuantityField(QuantityKind kind, QWidget* parent = nullptr);

    QuantityKind kind() const { return kind_; }
    /// Another kind of quantity; the value is lost.
    void setKind(QuantityKind kind);

    std::optional<double> value() const { return value_; }
    /// An empty value shows as an empty field.
    void setValue(std::optional<double> value);
    void setShowsHertz(bool on);
    /// A field that may be left empty (a limit that is not set).
    void setMayBeEmpty(bool on) { mayBeEmpty_ = on; }
    /// Whether the up and down keys move the value (off for signs that must not change).
    void setStepsByKeys(bool on) { stepsByKeys_ = on; }
    /// An extra condition; returns the sentence that says why a value is refused, or nothing.
    void setCheck(std::function<QString(double)> check) { check_ = std::move(check); }

    /// Takes what is typed, as Enter does. False where it cannot be taken.
    bool take();
    QString problem() const { return problem_; }

  Q_SIGNALS:
    /// The person gave another value.
    void valueEntered(std::optional<double> value);
    /// What is wrong with the typed text, or nothing any more.
    void problemChanged(const QString& problem);

  protected:
    bool event(QEvent* event) override;
    void focusInEvent(QFocusEvent* event) override;
    void focusOutEvent(QFocusEvent* event) override;
    void keyPressEvent(QKeyEvent* event) override;
    void paintEvent(QPaintEvent* event) override;

  private:
    void showAtRest();
    void showExact();
    void setProblem(const QString& problem);
    void step(double factor);

    QuantityKind kind_;
    std::optional<double> value_;
    bool showsHertz_ = true;
    bool mayBeEmpty_ = false;
    bool stepsByKeys_ = true;
    bool typing_ = false;
    std::function<QString(double)> check_;
    QString shownUnit_;
    QString problem_;
};

} // namespace cornerwright
