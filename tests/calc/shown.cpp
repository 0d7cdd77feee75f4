#include "shown.h"

#include <sstream>

namespace calc_tests {

std::string in_words(const Shown& shown) {
    std::ostringstream out;
    out.precision(17);
    if (const double* number = std::get_if<double>(&shown))
        out << "the number " << *number;
    else if (const std::string* text = std::get_if<std::string>(&shown))
        out << "the text \"" << *text << '"';
    else
        out << "the error " << static_cast<int>(std::get<CellError>(shown));
    return out.str();
}

} // namespace calc_tests
