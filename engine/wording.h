// Numbers become words here, once: the digits rule, decimal sign, report sentences.
#pragma once

#include "settings.h"

#include <cstdint>
#include <string>
#include <string_view>

namespace rankstead {

struct Outcome;

class NumberWriter {
public:
    explicit NumberWriter(DecimalSign sign) : sign_(sign) {}

    // Up to six significant digits, the whole part in full: "12.5", "1234567". Negative numbers have a true minus sign.
    [[nodiscard]] std::string number(double value) const;
    // "1,024"
    [[nodiscard]] std::string count(std::uint64_t value) const;
    // 0.95 is "95%".
    [[nodiscard]] std::string percent(double share) const;
    // "= 0.03", "< 0.001": two decimals above 0.01, three down to 0.001, more where rounding would cross 0.05.
    [[nodiscard]] std::string p(double value) const;

private:
    [[nodiscard]] std::string signed_decimals(std::string text) const;
    DecimalSign sign_;
};

[[nodiscard]] std::string sentence(const Outcome& outcome);
[[nodiscard]] std::string methods_sentence(const Outcome& outcome);
// How p was obtained.
[[nodiscard]] std::string method_words(const Outcome& outcome);
// How an exact law was found, to follow the method; empty for an approximation.
[[nodiscard]] std::string law_words(const Outcome& outcome);
[[nodiscard]] std::string ledger_words(const Outcome& outcome);

// The caution beside results: one quiet line, and in full.
[[nodiscard]] std::string_view caution_line() noexcept;
[[nodiscard]] std::string_view caution() noexcept;

} // namespace rankstead
