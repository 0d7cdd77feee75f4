// What a study is asked on the command line.
#pragma once

#include "catalogue.h"
#include "command_line.h"
#include "option_names.h"

#include <string>
#include <vector>

namespace rankstead::client {

// Everything that a study is asked, before any file is opened.
struct Request {
    Study study;
    OptionNames names;
    CommandLine line;
    std::vector<Answer> answers; // those asked for by --answer

    bool takes_file() const { return !names.data.empty(); }
};

// Throws a usage Failure for options and answers that the study does not have.
Request request_for(const Study& study, const std::vector<std::string>& arguments);

// Throws a usage Failure unless there is one file, or none for a study without data.
void refuse_wrong_files(const Request& asked);

// Throws a usage Failure where not one column is named.
void refuse_no_data_option(const Request& asked);

} // namespace rankstead::client
