#include "request.h"

#include "failure.h"
#include "study_options.h"
#include "words.h"

#include <algorithm>

namespace rankstead::client {
namespace {

Answer needed_answer(const Study& study, const std::string& word) {
    const std::optional<Answer> answer = find_answer(study, word);
    if (!answer) {
        throw usage_failure(study.word + " has no answer " + in_quotes(word) + ". Its answers are " +
                            joined(words_of(answers_of(study)), ", ") + '.');
    }
    return *answer;
}

} // namespace

Request request_for(const Study& study, const std::vector<std::string>& arguments) {
    OptionNames names = option_names_of(study);
    cxxopts::Options options = study_options(study, names);
    CommandLine line(options, arguments, help_command(study));
    std::vector<Answer> answers;
    for (const std::string& word : line.all("answer")) {
        answers.push_back(needed_answer(study, word));
    }
    return {study, std::move(names), std::move(line), std::move(answers)};
}

void refuse_wrong_files(const Request& asked) {
    const std::vector<std::string>& rest = asked.line.rest();
    const std::size_t wanted = asked.takes_file() ? 1 : 0;
    if (rest.size() > wanted) {
        throw usage_failure(in_quotes(rest[wanted]) + " is neither an option nor the file." + asked.line.see_help());
    }
    if (rest.size() < wanted) {
        throw usage_failure("Name the CSV file to read, or - for standard input." + asked.line.see_help());
    }
}

void refuse_no_data_option(const Request& asked) {
    const bool any = std::any_of(asked.names.data.begin(), asked.names.data.end(),
                                 [&](const OptionName& name) { return asked.line.has(name.option); });
    if (!any) {
        throw usage_failure("Say which columns to use: rankstead " + synopsis(asked.study, asked.names) + '.' +
                            asked.line.see_help());
    }
}

} // namespace rankstead::client
