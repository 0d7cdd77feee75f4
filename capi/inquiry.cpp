#include "inquiry.h"

#include "memo.h"
#include "words.h"

#include <algorithm>
#include <cstring>
#include <limits>

namespace rankstead {

namespace {

constexpr std::size_t most_cells = 100'000'000;
constexpr std::size_t most_memo_cells = 400'000;

[[noreturn]] void refuse_call(std::string reason) {
    throw Refusal(Status::bad_call, std::move(reason));
}

void require_utf8(std::string_view text, const char* what) {
    if (!is_utf8(text)) {
        refuse_call(std::string(what) + " is not valid UTF-8.");
    }
}

void check_size(std::string_view argument, const Borrowed& data) {
    if (data.columns != 0 && data.rows > std::numeric_limits<std::size_t>::max() / sizeof(rks_cell) / data.columns) {
        refuse_call(std::string(argument) + ": rows times columns is more than memory can hold.");
    }
    if (data.rows * data.columns > most_cells) {
        throw Refusal(Status::too_large, std::string(argument) + " has more than a hundred million cells.");
    }
}

// Why a cell cannot be read; null where it can.
const char* fault_of(const rks_cell& cell) {
    if (cell.reserved != 0) {
        return "the cell's member `reserved` must be 0.";
    }
    if (cell.kind != RKS_CELL_BLANK && cell.kind != RKS_CELL_NUMBER && cell.kind != RKS_CELL_TEXT) {
        return "the cell is of an unknown kind.";
    }
    return cell.kind == RKS_CELL_TEXT && cell.text == nullptr && cell.length > 0 ? "the cell's text is a null pointer."
                                                                                 : nullptr;
}

Cell converted(const rks_cell& cell) {
    if (cell.kind == RKS_CELL_NUMBER) {
        return Cell::of(cell.number);
    }
    return cell.kind == RKS_CELL_TEXT && cell.length > 0 ? Cell::of(std::string_view(cell.text, cell.length)) : Cell{};
}

// The data stay with the caller and are converted cell by cell, as they are read.
Block block_of(const char* argument, const Borrowed& data) {
    Block block{argument, {}, data.rows, data.columns};
    block.lent_size = data.rows * data.columns;
    if (const auto* numbers = std::get_if<const double*>(&data.data)) {
        block.lent = [values = *numbers](std::size_t i) { return Cell::of(values[i]); };
    } else if (const auto* cells = std::get_if<const rks_cell*>(&data.data)) {
        for (std::size_t i = 0; i < block.lent_size; ++i) {
            if (const char* fault = fault_of((*cells)[i])) {
                throw Refusal(Status::bad_call, fault,
                              {argument, i / data.columns + 1, i % data.columns + 1, data.columns});
            }
        }
        block.lent = [list = *cells](std::size_t i) { return converted(list[i]); };
    }
    return block;
}

// The same with cells of its own.
Block copied_block_of(const char* argument, const Borrowed& data) {
    const Block lent = block_of(argument, data);
    Block block{argument, {}, data.rows, data.columns};
    for (std::size_t i = 0; i < lent.size(); ++i) {
        block.cells.push_back(lent.at(i));
    }
    return block;
}

void append(std::string& key, const void* bytes, std::size_t size) {
    key.append(static_cast<const char*>(bytes), size);
}

template <class Value>
void append(std::string& key, const Value& value) {
    append(key, &value, sizeof value);
}

// Everything that the outcome depends on, byte for byte.
std::string memo_key(const StudyRow& study, const Settings& settings, const std::vector<Block>& blocks) {
    std::string key = std::string(study.word) + '\n';
    for (const SettingRow& row : settings_rows()) {
        const std::string value = row.show(settings, row);
        append(key, value.size());
        key += value;
    }
    for (const Block& block : blocks) {
        append(key, block.rows);
        append(key, block.columns);
        for (std::size_t i = 0; i < block.size(); ++i) {
            const Cell cell = block.at(i);
            key += static_cast<char>(cell.kind);
            if (cell.kind == Cell::Kind::number) {
                append(key, cell.number);
            } else if (cell.kind == Cell::Kind::text) {
                append(key, cell.text.size());
                key += cell.text;
            }
        }
    }
    return key;
}

std::vector<Block> blocks_of(const rks_inquiry& inquiry) {
    std::vector<Block> blocks;
    for (std::size_t i = 0; i < inquiry.arguments.size(); ++i) {
        const ArgumentRow& row = inquiry.study->arguments[i];
        blocks.push_back(block_of(row.word, inquiry.arguments[i]));
        if (blocks.back().size() == 0) {
            throw Refusal(Status::no_data,
                          std::string(row.word) + " is missing. Give the cells that hold it. " + row.help);
        }
    }
    return blocks;
}

std::shared_ptr<const Outcome> computed(const rks_inquiry& inquiry) {
    const std::vector<Block> blocks = blocks_of(inquiry);
    Arguments arguments;
    std::size_t cells = 0;
    for (const Block& block : blocks) {
        arguments.push_back(&block);
        cells += block.size();
    }
    if (cells > most_memo_cells) {
        return std::make_shared<const Outcome>(inquiry.study->run(arguments, inquiry.settings));
    }
    std::string key = memo_key(*inquiry.study, inquiry.settings, blocks);
    auto outcome = shared_memo().find(key);
    if (!outcome) {
        outcome = std::make_shared<const Outcome>(inquiry.study->run(arguments, inquiry.settings));
        shared_memo().keep(std::move(key), outcome);
    }
    return outcome;
}

void fail(rks_inquiry& inquiry, Status status) {
    const std::string words(status_text(static_cast<std::int32_t>(status)));
    inquiry.failure = {status, words, words, {}};
}

// Any change discards what an earlier run found.
void discard(rks_inquiry& inquiry) {
    inquiry.outcome.reset();
    inquiry.failure.reset();
    inquiry.handed_out.clear();
}

} // namespace

void lend(rks_inquiry& inquiry, std::string_view argument, const Borrowed& data) {
    const std::string word = folded(argument);
    check_size(word, data);
    if (word == "settings") {
        Settings changed = inquiry.settings;
        const Block block = copied_block_of("settings", data);
        for (const Cell& cell : block.cells) {
            require_utf8(cell.text, "a cell of the settings");
        }
        apply_settings_block(changed, *inquiry.study, block);
        inquiry.settings = std::move(changed);
        discard(inquiry);
        return;
    }
    const auto& rows = inquiry.study->arguments;
    const auto row =
        std::find_if(rows.begin(), rows.end(), [&](const ArgumentRow& candidate) { return word == candidate.word; });
    if (row == rows.end()) {
        std::vector<std::string> words;
        for (const ArgumentRow& candidate : rows) {
            words.emplace_back(candidate.word);
        }
        words.emplace_back("settings");
        throw Refusal(Status::unknown_argument, std::string(inquiry.study->word) + " has no argument \"" +
                                                    std::string(argument) + "\". It has " + listed(words) + ".");
    }
    inquiry.arguments[static_cast<std::size_t>(row - rows.begin())] = data;
    discard(inquiry);
}

void set_setting(rks_inquiry& inquiry, std::string_view setting, std::string_view value) {
    require_utf8(setting, "the name of the setting");
    require_utf8(value, "the value of the setting");
    apply_setting(inquiry.settings, *inquiry.study, setting, value);
    discard(inquiry);
}

void run(rks_inquiry& inquiry) {
    discard(inquiry);
    try {
        inquiry.outcome = computed(inquiry);
    } catch (const Refusal& refusal) {
        inquiry.failure = {refusal.status(), refusal.message(), refusal.reason(), refusal.place()};
        throw;
    } catch (const std::bad_alloc&) {
        fail(inquiry, Status::out_of_memory);
        throw;
    } catch (...) {
        fail(inquiry, Status::internal);
        throw;
    }
}

const AnswerRow& answer_asked(const rks_inquiry& inquiry, std::string_view answer) {
    require_utf8(answer, "the answer's name");
    const AnswerRow& row = answer_of(*inquiry.study, answer);
    if (!inquiry.outcome && !inquiry.failure) {
        throw Refusal(Status::not_run, "the inquiry has not been run since its data or settings changed.");
    }
    return row;
}

Reading read_answer(const rks_inquiry& inquiry, const AnswerRow& answer) {
    return answer.read(*inquiry.outcome);
}

rks_inquiry::HandedOut& place_for(const rks_inquiry& inquiry, const AnswerRow& answer) {
    inquiry.handed_out.resize(answers().size());
    auto& place = inquiry.handed_out[static_cast<std::size_t>(&answer - answers().data())];
    if (!place) {
        place = std::make_unique<rks_inquiry::HandedOut>();
    }
    return *place;
}

} // namespace rankstead
