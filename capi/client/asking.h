// Putting the question to the library: settings, data, run, and what went wrong in the terms of the file.
#pragma once

#include "catalogue.h"
#include "command_line.h"
#include "failure.h"
#include "inquiry.h"
#include "option_names.h"
#include "selection.h"

#include <string>

namespace rankstead::client {

// The settings on the command line. Throws a usage Failure for a value that a setting does not take.
void give_settings(Inquiry& inquiry, const OptionNames& names, const CommandLine& line);

// What the client sets by itself, where the study has the setting and the command line does not give it: the cells of a
// CSV file are texts, read with a decimal point; the headings or labels name the groups.
void give_settings_of_file(Inquiry& inquiry, const OptionNames& names, const CommandLine& line,
                           const std::vector<Series>& data);

// The sign that separates the decimals in the file.
char decimal_sign_of(const OptionNames& names, const CommandLine& line);

// The data have to live until run returns.
void give_data(Inquiry& inquiry, const std::vector<Series>& data);

// Why the run failed with this status, with file, column and row where it failed on a cell.
Failure run_failure(const Inquiry& inquiry, rks_status status, const std::string& source, const OptionNames& names,
                    const std::vector<Series>& data);

} // namespace rankstead::client
