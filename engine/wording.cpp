#include "wording.h"

#include "decimal.h"
#include "outcome.h"
#include "version.h"

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <limits>

namespace rankstead {

namespace {

// Halves are rounded away from zero, as people do: a tie is a double just short of the next one.
std::string fixed_text(double value, int decimals) {
    value = value == 0 ? 0 : std::nextafter(value, std::copysign(HUGE_VAL, value));
    std::array<char, 400> buffer{};
    const auto end =
        std::to_chars(buffer.data(), buffer.data() + buffer.size(), value, std::chars_format::fixed, decimals);
    return {buffer.data(), end.ptr};
}

std::string without_trailing_zeros(std::string text) {
    if (text.find('.') == std::string::npos) {
        return text;
    }
    text.erase(text.find_last_not_of('0') + 1);
    if (text.back() == '.') {
        text.pop_back();
    }
    return text == "-0" ? "0" : text;
}

int p_decimals(double value) {
    int decimals = value > 0.01 ? 2 : 3;
    // One digit more for as long as rounding would put p on 0.05 or on the other side of it.
    while (decimals < 15) {
        double shown = 0;
        const std::string text = fixed_text(value, decimals);
        std::from_chars(text.data(), text.data() + text.size(), shown);
        if (value == 0.05 || (value < 0.05 ? shown < 0.05 : shown > 0.05)) {
            break;
        }
        ++decimals;
    }
    return decimals;
}

} // namespace

std::string NumberWriter::signed_decimals(std::string text) const {
    if (sign_ == DecimalSign::comma) {
        std::replace(text.begin(), text.end(), '.', ',');
    }
    // A minus sign proper (U+2212): a line may break after a hyphen and leave the sign behind.
    return text.front() == '-' ? "\xE2\x88\x92" + text.substr(1) : text;
}

std::string NumberWriter::number(double value) const {
    constexpr int significant = 6;
    if (value == 0) {
        return "0";
    }
    if (!std::isfinite(value)) {
        return "beyond " + number(std::copysign(std::numeric_limits<double>::max(), value));
    }
    const double size = std::fabs(value);
    if (size >= 1e15 || size < 1e-5) {
        std::array<char, 40> buffer{};
        const auto end =
            std::to_chars(buffer.data(), buffer.data() + buffer.size(), value, std::chars_format::general, significant);
        return signed_decimals({buffer.data(), end.ptr});
    }
    const int whole = static_cast<int>(std::floor(std::log10(size))) + 1;
    return signed_decimals(without_trailing_zeros(fixed_text(value, std::max(0, significant - whole))));
}

std::string NumberWriter::count(std::uint64_t value) const {
    std::string digits = std::to_string(value);
    for (std::size_t at = digits.size(); at > 3;) {
        at -= 3;
        digits.insert(at, 1, sign_ == DecimalSign::comma ? '.' : ',');
    }
    return digits;
}

std::string NumberWriter::percent(double share) const {
    return signed_decimals(without_trailing_zeros(fixed_text(100 * share, 2))) + "%";
}

std::string NumberWriter::p(double value) const {
    if (value < 0.001) {
        return "< " + signed_decimals("0.001");
    }
    return "= " + signed_decimals(fixed_text(value, p_decimals(value)));
}

namespace {

// The parts of the sentence, for one outcome.
class SentenceWriter {
public:
    explicit SentenceWriter(const Outcome& outcome) : outcome_(outcome), writer_(outcome.settings.decimal_sign) {}

    [[nodiscard]] std::string text() const {
        return subject() + ": " + quantity() + " is " + measured(outcome_.estimate) + " (" + interval() + "); p " +
               writer_.p(outcome_.p) + ", " + test() + ".";
    }

private:
    [[nodiscard]] std::string size(const Sample& sample) const {
        return sample.name + " (n = " + std::to_string(sample.n) + ")";
    }

    [[nodiscard]] std::string subject() const {
        switch (outcome_.study) {
        case StudyId::pairs:
            return outcome_.second->name + " against " + outcome_.first.name + " in " + std::to_string(outcome_.n) +
                   (outcome_.n == 1 ? " pair" : " pairs");
        case StudyId::groups:
            return size(outcome_.first) + " against " + size(*outcome_.second);
        default:
            return size(outcome_.first) + " against the reference " + measured(outcome_.reference);
        }
    }

    [[nodiscard]] std::string quantity() const {
        switch (outcome_.study) {
        case StudyId::pairs:
            return "the estimated change, " + outcome_.second->name + " minus " + outcome_.first.name + ",";
        case StudyId::groups:
            return "the estimated shift, " + outcome_.first.name + " minus " + outcome_.second->name + ",";
        default:
            return "the estimated centre";
        }
    }

    [[nodiscard]] std::string measured(double value) const {
        const std::string& unit = outcome_.settings.unit;
        return writer_.number(value) + (unit.empty() ? "" : " " + unit);
    }

    [[nodiscard]] std::string interval() const {
        const std::string level = writer_.percent(outcome_.settings.level.to_double()) + " confidence ";
        if (!outcome_.observations.interval_reason.empty()) {
            return "no " + writer_.percent(outcome_.settings.level.to_double()) +
                   " confidence interval exists with so few values";
        }
        if (outcome_.lower.value && outcome_.upper.value) {
            return level + "interval " + writer_.number(*outcome_.lower.value) + " to " +
                   writer_.number(*outcome_.upper.value);
        }
        return outcome_.lower.value ? level + "limit: at least " + writer_.number(*outcome_.lower.value)
                                    : level + "limit: at most " + writer_.number(*outcome_.upper.value);
    }

    [[nodiscard]] std::string test() const {
        const Side side = outcome_.settings.side;
        const std::string sided = side == Side::two_sided ? "two-sided"
                                  : side == Side::higher  ? "one-sided (higher)"
                                                          : "one-sided (lower)";
        const std::string margin = outcome_.settings.margin.coefficient == 0
                                       ? ""
                                       : ", against a margin of " + measured(outcome_.settings.margin.to_double());
        return sided + (outcome_.exact ? " exact " : " approximate ") + test_name(outcome_) + " test" + margin;
    }

    static std::string test_name(const Outcome& outcome) {
        if (outcome.study == StudyId::groups) {
            return "rank sum";
        }
        return outcome.settings.test == Test::sign ? "sign" : "signed rank";
    }

    const Outcome& outcome_;
    NumberWriter writer_;
};

std::string zeros_words(const Outcome& outcome) {
    if (outcome.study == StudyId::groups || outcome.zeros == 0) {
        return "";
    }
    if (outcome.settings.test == Test::sign) {
        return ", zeros set aside";
    }
    return outcome.settings.zeros == Zeros::drop ? ", zeros dropped before ranking (Wilcoxon 1945)"
                                                 : ", zeros ranked and then set aside (Pratt 1959)";
}

std::string test_title(const Outcome& outcome) {
    if (outcome.study == StudyId::groups) {
        return "Wilcoxon-Mann-Whitney rank sum test";
    }
    return outcome.settings.test == Test::sign ? "sign test" : "Wilcoxon signed rank test";
}

std::string estimate_title(const Outcome& outcome) {
    if (outcome.study != StudyId::groups && outcome.settings.test == Test::sign) {
        return outcome.study == StudyId::single ? "the centre is the median" : "the change is the median change";
    }
    return outcome.study == StudyId::groups  ? "the shift is the Hodges-Lehmann estimate"
           : outcome.study == StudyId::pairs ? "the change is the Hodges-Lehmann estimate"
                                             : "the centre is the Hodges-Lehmann estimate";
}

} // namespace

std::string sentence(const Outcome& outcome) {
    return SentenceWriter(outcome).text();
}

std::string method_words(const Outcome& outcome) {
    if (outcome.exact) {
        const bool ties =
            outcome.tied > 0 && !(outcome.settings.test == Test::sign && outcome.study != StudyId::groups);
        return "exact" + std::string(ties ? ", conditional on the ties" : "") + zeros_words(outcome);
    }
    if (outcome.law == LawKind::saddlepoint) {
        return "saddlepoint approximation with lattice correction" + zeros_words(outcome);
    }
    return "normal approximation, tie-corrected, with continuity correction" + zeros_words(outcome);
}

std::string law_words(const Outcome& outcome) {
    switch (outcome.law) {
    case LawKind::counted:
        return ", by counting arrangements";
    case LawKind::summed:
        return ", by dynamic programming";
    case LawKind::closed:
        return ", by inversion of the closed characteristic function";
    case LawKind::inverted:
        return ", by inversion of the characteristic function";
    case LawKind::binomial:
        return ", by the binomial law";
    case LawKind::saddlepoint:
    case LawKind::normal:
        break;
    }
    return "";
}

std::string methods_sentence(const Outcome& outcome) {
    const NumberWriter writer(outcome.settings.decimal_sign);
    const std::string compared = outcome.study == StudyId::groups  ? "The two groups were compared"
                                 : outcome.study == StudyId::pairs ? "Paired measurements were compared"
                                                                   : "Values were compared with the reference";
    const std::string sided = outcome.settings.side == Side::two_sided ? "two-sided" : "one-sided";
    const std::string interval = outcome.settings.interval == IntervalRule::matching
                                     ? " interval found by inverting the same test"
                                     : " interval of classical order statistics";
    return compared + " by the " + test_title(outcome) + " (" + sided + "; " + method_words(outcome) + "); " +
           estimate_title(outcome) + " with a " + writer.percent(outcome.settings.level.to_double()) + " confidence" +
           interval + " (Rankstead " + std::string(version) + ").";
}

std::string ledger_words(const Outcome& outcome) {
    std::string words;
    for (const Ledger& ledger : outcome.ledgers) {
        const auto part = [](std::size_t count, const char* name) { return std::to_string(count) + " " + name; };
        words += (words.empty() ? "" : "; ") + ledger.argument + ": " + part(ledger.seen, "seen") + " = " +
                 part(ledger.used, "used") + " + " + part(ledger.blank, "blank") + " + " +
                 part(ledger.heading + ledger.missing_words, "text") + " + " + part(ledger.censored, "censored") +
                 " + " + part(ledger.unpaired, "unpaired");
        if (ledger.heading + ledger.missing_words > 0) {
            words += " (text: " + part(ledger.heading, "heading") + ", " + part(ledger.missing_words, "missing") + ")";
        }
    }
    return words;
}

std::string_view caution_line() noexcept {
    return "For audit, improvement, research and teaching; not for the diagnosis, monitoring or treatment of a person.";
}

std::string_view caution() noexcept {
    return "Rankstead describes and compares groups for audit, improvement, research and teaching. It is not for the "
           "diagnosis, monitoring or treatment of a person. It supports and does not replace a statistician and "
           "licensed practice; follow local governance. A before/after difference does not by itself show a cause. A "
           "large p is not evidence of no difference.";
}

} // namespace rankstead
