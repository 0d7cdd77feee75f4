// The reference of Rankstead in Markdown, from the catalogue.
#pragma once

#include <ostream>

namespace rankstead::client {

// Every study with its arguments, every answer, every setting, and the caution.
void print_reference(std::ostream& out);

} // namespace rankstead::client
