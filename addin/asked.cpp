#include "asked.h"

#include "convert.h"

#include <rankstead.h>

namespace rankstead::calc {

using com::sun::star::uno::Any;

namespace {

// The answer word, from a text or from one cell. Left out or blank: the default. Nothing for anything else.
std::optional<std::string> asked_word(std::size_t study, const Range& range) {
    std::string word;
    if (!range.given())
        return rks_study_default_answer(study);
    if (range.rows() != 1 || range.columns() != 1 || !text_of(range.at(0, 0), word))
        return std::nullopt;
    return word.empty() ? rks_study_default_answer(study) : word;
}

} // namespace

Range argument(const Arguments& arguments, std::size_t position) {
    return position < static_cast<std::size_t>(arguments.getLength())
               ? Range(arguments[static_cast<sal_Int32>(position)])
               : Range(Any());
}

std::optional<Asked> what_is_asked(std::size_t study, const Arguments& arguments) {
    const bool helper = rks_study_form(study) == RKS_FORM_HELPER;
    const std::optional<std::string> word =
        asked_word(study, helper ? Range(Any()) : argument(arguments, rks_argument_count(study)));
    const std::int32_t found = word ? rks_answer_find(word->c_str()) : -1;
    if (found < 0 || rks_answer_fits(static_cast<std::size_t>(found), study) == 0)
        return std::nullopt;
    return Asked{*word, rks_answer_kind(static_cast<std::size_t>(found))};
}

} // namespace rankstead::calc
