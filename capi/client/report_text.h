// Answers for people: a block of labels and values, or single answers.
#pragma once

#include "catalogue.h"
#include "inquiry.h"

#include <ostream>
#include <string>
#include <vector>

namespace rankstead::client {

// The report of a study, `notes` of the client below it, and the caution.
void print_report(const Inquiry& inquiry, const Study& study, const std::vector<std::string>& notes, std::ostream& out);

// One answer on a line of its own; a table as aligned columns. Returns why it cannot be given, or an empty text.
std::string print_answer(const Inquiry& inquiry, const Answer& answer, std::ostream& out);

} // namespace rankstead::client
