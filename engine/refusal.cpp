#include "refusal.h"

namespace rankstead {

std::string_view status_text(std::int32_t status) noexcept {
    switch (static_cast<Status>(status)) {
    case Status::ok:
        return "Done.";
    case Status::blank:
        return "This answer is blank on purpose.";
    case Status::bad_call:
        return "The call itself is wrong: a null pointer, an impossible size or value, or text that is not UTF-8.";
    case Status::unknown_study:
        return "There is no study of this name.";
    case Status::unknown_argument:
        return "This study has no argument of this name.";
    case Status::unknown_answer:
        return "This study has no answer of this name.";
    case Status::unknown_setting:
        return "There is no setting of this name, or it does not fit this study.";
    case Status::bad_setting:
        return "This setting does not take this value.";
    case Status::wrong_kind:
        return "This answer is not a number.";
    case Status::not_run:
        return "The inquiry has not been run since its data or settings changed.";
    case Status::bad_data:
        return "A cell in the data cannot be used.";
    case Status::no_data:
        return "There are no usable values.";
    case Status::unequal_lengths:
        return "The two data ranges differ in length.";
    case Status::too_large:
        return "There are more values than this call takes.";
    case Status::no_answer:
        return "This number cannot be given for these data.";
    case Status::out_of_memory:
        return "There is not enough memory.";
    case Status::internal:
        return "Rankstead itself is at fault. Please report it.";
    }
    return "There is no such status number.";
}

std::string in_words(const Place& place) {
    std::string words = place.argument + ", row " + std::to_string(place.row);
    if (place.columns > 1) {
        words += ", column " + std::to_string(place.column);
    }
    return words;
}

} // namespace rankstead
