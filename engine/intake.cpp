#include "intake.h"

#include "refusal.h"
#include "words.h"

#include <algorithm>
#include <array>
#include <cmath>

namespace rankstead {

namespace {

// Each cell of an argument as a decimal, or zero where there is none, with the ledger so far; `used` is counted by the
// caller.
struct Slots {
    std::string heading;
    std::vector<Decimal> values;
    std::vector<bool> filled;
    Ledger ledger;
};

std::string quoted(std::string_view text) {
    constexpr std::size_t longest = 40;
    if (text.size() <= longest) {
        return "\"" + std::string(text) + "\"";
    }
    std::size_t cut = longest;
    while (cut > 0 && (static_cast<unsigned char>(text[cut]) & 0xC0U) == 0x80U) {
        --cut;
    }
    return "\"" + std::string(text.substr(0, cut)) + "...\"";
}

bool is_number_in_some_way(std::string_view text) {
    return Decimal::from_text(text, '.').has_value() || Decimal::from_text(text, ',').has_value();
}

bool is_beyond_limit(std::string_view text) {
    return !text.empty() && (text.front() == '<' || text.front() == '>' || text.starts_with("\xE2\x89\xA4") ||
                             text.starts_with("\xE2\x89\xA5"));
}

// Common ways to write that a value is missing. They are never taken for a heading, or a patient would vanish.
bool is_known_missing_word(std::string_view text) {
    constexpr std::array known{"n/a", "na", "nan", "nd", "none", "null", "missing", "unknown", "nil", "#n/a"};
    const std::string word = folded(text);
    return std::find(known.begin(), known.end(), word) != known.end();
}

bool has_letter(std::string_view text) {
    return std::any_of(text.begin(), text.end(), [](char c) {
        return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || static_cast<unsigned char>(c) >= 0x80;
    });
}

class SlotReader {
public:
    // Reads the first `count` cells of the block.
    SlotReader(const Block& block, const Settings& settings, std::size_t count)
        : block_(block), settings_(settings), count_(count) {
        for (const std::string& word : settings.missing) {
            missing_.push_back(folded(word));
        }
    }

    Slots read() {
        slots_.ledger.argument = block_.argument;
        slots_.ledger.seen = count_;
        slots_.values.reserve(count_);
        slots_.filled.reserve(count_);
        for (std::size_t i = 0; i < count_; ++i) {
            const std::optional<Decimal> value = read_cell(i);
            slots_.values.push_back(value.value_or(Decimal{}));
            slots_.filled.push_back(value.has_value());
        }
        return std::move(slots_);
    }

private:
    std::optional<Decimal> read_cell(std::size_t index) {
        const Cell cell = block_.at(index);
        if (cell.kind == Cell::Kind::number) {
            return read_double(cell.number, index);
        }
        const std::string_view text = trimmed(cell.text);
        if (cell.kind == Cell::Kind::blank || text.empty()) {
            ++slots_.ledger.blank;
            return std::nullopt;
        }
        return read_text(text, index);
    }

    std::optional<Decimal> read_double(double value, std::size_t index) {
        if (!std::isfinite(value)) {
            refuse(index, std::isnan(value)
                              ? "this is not a number (NaN). Leave the cell empty if the value is missing."
                              : "this number is infinite. Correct the cell, or leave it empty.");
        }
        return Decimal::from_double(value);
    }

    std::optional<Decimal> read_text(std::string_view text, std::size_t index) {
        if (!is_utf8(text)) {
            refuse(index, "this text is not valid UTF-8. Correct the cell.");
        }
        if (!missing_.empty() && std::find(missing_.begin(), missing_.end(), folded(text)) != missing_.end()) {
            ++slots_.ledger.missing_words;
            return std::nullopt;
        }
        if (settings_.numbers != NumberTexts::refused) {
            if (auto value = Decimal::from_text(text, settings_.numbers == NumberTexts::comma ? ',' : '.')) {
                return value;
            }
        }
        if (is_heading(text, index)) {
            slots_.heading = text;
            ++slots_.ledger.heading;
            return std::nullopt;
        }
        refuse_text(text, index);
    }

    // A heading above nothing but blanks is still one.
    bool is_heading(std::string_view text, std::size_t index) const {
        return index == 0 && block_.size() > 1 && has_letter(text) && !is_beyond_limit(text) &&
               !is_number_in_some_way(text) && !is_known_missing_word(text);
    }

    [[noreturn]] void refuse_text(std::string_view text, std::size_t index) const {
        if (is_beyond_limit(text)) {
            refuse(index, quoted(text) + " is a value beyond a limit, not a number. It is neither missing nor half the "
                                         "limit, so nothing was computed. Take advice before replacing it.");
        }
        if (is_number_in_some_way(text)) {
            refuse(index, quoted(text) + " is text that looks like a number. Store it as a number, or say how to read "
                                         "it with the setting numbers (numbers=point or numbers=comma).");
        }
        refuse(index, quoted(text) + " is text, not a number. Correct the cell, or empty it; if the word means that "
                                     "the value is missing, list it in the setting missing.");
    }

    [[noreturn]] void refuse(std::size_t index, std::string reason) const {
        throw Refusal(Status::bad_data, std::move(reason),
                      {block_.argument, index / block_.columns + 1, index % block_.columns + 1, block_.columns});
    }

    const Block& block_;
    const Settings& settings_;
    std::size_t count_;
    std::vector<std::string> missing_;
    Slots slots_;
};

Slots read_slots(const Block& block, const Settings& settings, std::size_t count) {
    return SlotReader(block, settings, count).read();
}

Column column_of(Slots&& slots) {
    std::size_t kept = 0;
    for (std::size_t i = 0; i < slots.values.size(); ++i) {
        if (slots.filled[i]) {
            slots.values[kept++] = slots.values[i];
        }
    }
    slots.values.resize(kept);
    slots.ledger.used = kept;
    return {std::move(slots.heading), std::move(slots.values), std::move(slots.ledger)};
}

[[noreturn]] void refuse_empty(const Block& block) {
    throw Refusal(Status::no_data, block.argument + ": there is not one value among its " +
                                       std::to_string(block.size()) + " cells. Select cells that hold numbers.");
}

// A selection often reaches beyond the data; what is blank below the last filled cell is not a missing value.
std::size_t size_without_blanks_at_the_end(const Block& block) {
    std::size_t size = block.size();
    const auto is_blank = [](const Cell& cell) {
        return cell.kind == Cell::Kind::blank || (cell.kind == Cell::Kind::text && trimmed(cell.text).empty());
    };
    while (size > 0 && is_blank(block.at(size - 1))) {
        --size;
    }
    return size;
}

void check_headings(const Slots& first, const Slots& second, const Block& second_block, const Block& first_block) {
    const bool one = first.ledger.heading > 0 && second.ledger.heading == 0 && second.filled.front();
    const bool other = second.ledger.heading > 0 && first.ledger.heading == 0 && first.filled.front();
    if (one || other) {
        const Block& number = one ? second_block : first_block;
        const Block& heading = one ? first_block : second_block;
        throw Refusal(Status::bad_data,
                      "there is a number here but a heading in the same row of " + heading.argument +
                          ". Select the same rows in both.",
                      {number.argument, 1, 1, number.columns});
    }
}

bool are_different_numbers(const Cell& a, const Cell& b) {
    return a.kind == Cell::Kind::number && b.kind == Cell::Kind::number && a.number != b.number;
}

PairedColumns complete_rows(Slots&& a, Slots&& b, const Block& first, const Block& second) {
    std::size_t kept = 0;
    std::size_t equal_at_fifteen_digits = 0;
    for (std::size_t i = 0; i < a.values.size(); ++i) {
        if (a.filled[i] && b.filled[i]) {
            const bool equal = a.values[i] == b.values[i];
            equal_at_fifteen_digits += equal && are_different_numbers(first.at(i), second.at(i)) ? 1U : 0U;
            a.values[kept] = a.values[i];
            b.values[kept] = b.values[i];
            ++kept;
        } else {
            a.ledger.unpaired += a.filled[i] ? 1U : 0U;
            b.ledger.unpaired += b.filled[i] ? 1U : 0U;
        }
    }
    a.values.resize(kept);
    b.values.resize(kept);
    a.ledger.used = b.ledger.used = kept;
    return {{std::move(a.heading), std::move(a.values), std::move(a.ledger)},
            {std::move(b.heading), std::move(b.values), std::move(b.ledger)},
            equal_at_fifteen_digits};
}

} // namespace

Column read_column(const Block& block, const Settings& settings) {
    Column column = column_of(read_slots(block, settings, size_without_blanks_at_the_end(block)));
    if (column.values.empty()) {
        refuse_empty(block);
    }
    return column;
}

PairedColumns read_pairs(const Block& first, const Block& second, const Settings& settings) {
    if (first.size() != second.size()) {
        throw Refusal(Status::unequal_lengths, first.argument + " has " + std::to_string(first.size()) + " cells and " +
                                                   second.argument + " has " + std::to_string(second.size()) +
                                                   ". Pairs are read row by row: select the same rows in both.");
    }
    Slots a = read_slots(first, settings, first.size());
    Slots b = read_slots(second, settings, second.size());
    if (!a.values.empty()) {
        check_headings(a, b, second, first);
    }
    PairedColumns pairs = complete_rows(std::move(a), std::move(b), first, second);
    if (pairs.first.values.empty()) {
        throw Refusal(Status::no_data, "not one row has a value in both " + first.argument + " and " + second.argument +
                                           ". Select two ranges that hold numbers in the same rows.");
    }
    return pairs;
}

Decimal read_number(const Block& block, const Settings& settings) {
    Column column = read_column(block, settings);
    if (column.values.size() != 1) {
        throw Refusal(Status::bad_data, block.argument + " must be a single number, but there are " +
                                            std::to_string(column.values.size()) + " numbers. Select one cell.");
    }
    return column.values.front();
}

} // namespace rankstead
