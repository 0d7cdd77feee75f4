// What one call of a cell function asks for.
#ifndef RANKSTEAD_ADDIN_ASKED_H
#define RANKSTEAD_ADDIN_ASKED_H

#include "range.h"

#include <cstddef>
#include <cstdint>
#include <optional>
#include <string>

namespace rankstead::calc {

using Arguments = com::sun::star::uno::Sequence<com::sun::star::uno::Any>;

// The argument at a position; not given if there are fewer.
Range argument(const Arguments& arguments, std::size_t position);

struct Asked {
    std::string word;
    std::int32_t kind; // RKS_ANSWER_...
};

// Nothing if the word is unknown to the study, or is not one word: it cannot be known whether a number or a text was
// meant, so all that can be shown for it is an error.
std::optional<Asked> what_is_asked(std::size_t study, const Arguments& arguments);

} // namespace rankstead::calc

#endif
