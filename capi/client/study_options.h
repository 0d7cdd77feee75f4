// The options of a study, from the catalogue.
#pragma once

#include "catalogue.h"
#include "option_names.h"

#include <cxxopts.hpp>

#include <string>

namespace rankstead::client {

OptionNames option_names_of(const Study& study);

// "rankstead groups", with the options for its data, the long layout, its settings and the output.
cxxopts::Options study_options(const Study& study, const OptionNames& names);

// What --help prints.
std::string study_help(const Study& study, const OptionNames& names);

// "rankstead groups --help"
std::string help_command(const Study& study);

// "groups FILE --first COLUMN --second COLUMN", as it is typed after the name of the program.
std::string synopsis(const Study& study, const OptionNames& names);

// The last lines of every help text.
std::string exit_status_help();

} // namespace rankstead::client
