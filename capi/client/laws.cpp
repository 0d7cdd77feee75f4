#include "laws.h"

#include "command_line.h"
#include "law_table.h"
#include "report_json.h"
#include "study_options.h"
#include "words.h"

#include <cmath>

namespace rankstead::client {
namespace {

// The two questions about a law differ in what is given and what is found.
struct Question {
    const char* word;  // of the sub-command
    const char* given; // option
    const char* found; // key in JSON
    const char* help;
};

constexpr Question tail_question{"tail", "statistic", "p",
                                 "Exact probability, without ties and zeros, of a statistic at least as extreme."};
constexpr Question critical_question{
    "critical", "alpha", "critical",
    "Statistic at which the exact probability, without ties and zeros, reaches a level: the last one, seen from the "
    "middle, that is still at most alpha."};

std::string command(const Question& question) {
    return std::string("rankstead ") + question.word;
}

std::string given_help(const Question& question, const Law& law) {
    return &question == &tail_question ? law.statistic_help : "The level, above 0 and below 1, e.g. 0.05";
}

cxxopts::Options options_for(const Question& question, const Law& law) {
    cxxopts::Options options("rankstead", std::string(question.help) + "\nLaw: " + law.help + ".\n");
    options.custom_help(std::string(question.word) + ' ' + law.word + " [OPTION...]").set_width(100);
    cxxopts::OptionAdder add = options.add_options("Law");
    for (const SizeOption& size : law.sizes) {
        add(size.option, size.help, cxxopts::value<std::string>(), "COUNT");
    }
    add(question.given, given_help(question, law), cxxopts::value<std::string>(), "NUMBER");
    add("side", "two-sided, higher or lower [two-sided]; the probability includes the statistic itself",
        cxxopts::value<std::string>(), "SIDE");
    add("json", "Print one JSON object");
    add("help", "Print this help");
    return options;
}

// A question with its numbers, as given.
struct Asked {
    const Question& question;
    const Law& law;
    Sizes sizes;
    double given;
    std::string side;
};

Asked asked(const Question& question, const Law& law, const CommandLine& line) {
    Asked result{question, law, {}, 0.0, line.one("side").value_or("two-sided")};
    for (const SizeOption& size : law.sizes) {
        result.sizes.push_back(line.count(size.option));
    }
    result.given = line.number(question.given);
    return result;
}

Failure refusal(const Asked& asked, rks_status status) {
    const bool statistic = &asked.question == &tail_question;
    if (status == RKS_BAD_CALL) {
        return usage_failure(std::string("--") + asked.question.given + ' ' + shortest(asked.given) +
                             (statistic ? " cannot be: with these sizes it is a whole number from 0 to " +
                                              shortest(asked.law.largest(asked.sizes)) + '.'
                                        : " is no level: it lies above 0 and below 1."));
    }
    return {exit_for(status), std::string(asked.law.word) + ": " + rks_status_text(status)};
}

double found(const Asked& asked) {
    double number = 0;
    const auto function = &asked.question == &tail_question ? asked.law.tail : asked.law.critical;
    const rks_status status = function(asked.sizes, asked.given, find_side(asked.side), &number);
    if (status != RKS_OK) {
        throw refusal(asked, status);
    }
    return number;
}

void print_json(const Asked& asked, double number, std::ostream& out) {
    Json object = {{"law", asked.law.word}};
    for (std::size_t i = 0; i < asked.sizes.size(); ++i) {
        object[asked.law.sizes[i].option] = asked.sizes[i];
    }
    object[asked.question.given] = json_number(asked.given);
    object["side"] = hyphenated(asked.side);
    object[asked.question.found] = std::isnan(number) ? Json(nullptr) : json_number(number);
    out << json_text(object);
}

Exit print(const Asked& asked, bool json, const Console& console) {
    const double number = found(asked);
    if (json) {
        print_json(asked, number, console.out);
    } else if (!std::isnan(number)) {
        console.out << shortest(number) << '\n';
    }
    if (std::isnan(number)) {
        throw data_failure("With these sizes no statistic has a probability of " + shortest(asked.given) + " or less.");
    }
    return Exit::done;
}

Exit run_law(const Question& question, const Law& law, const std::vector<std::string>& arguments,
             const Console& console) {
    cxxopts::Options options = options_for(question, law);
    const CommandLine line(options, arguments, command(question) + ' ' + law.word + " --help");
    if (line.has("help")) {
        console.out << options.help({"Law"}) << '\n' << exit_status_help();
        return Exit::done;
    }
    if (!line.rest().empty()) {
        throw usage_failure(in_quotes(line.rest().front()) + " is not an option." + line.see_help());
    }
    return print(asked(question, law, line), line.has("json"), console);
}

Exit print_laws(const Question& question, const Console& console) {
    console.out << question.help << "\n\nUsage:\n";
    for (const Law& law : laws()) {
        console.out << "  " << command(question) << ' ' << law.word << " --help    " << law.help << '\n';
    }
    return Exit::done;
}

Exit run(const Question& question, const std::vector<std::string>& arguments, const Console& console) {
    if (arguments.empty()) {
        throw usage_failure("Say which law: " + joined(law_words(), " or ") + ". See: " + command(question) +
                            " --help");
    }
    if (arguments.front() == "--help") {
        return print_laws(question, console);
    }
    return run_law(question, find_law(arguments.front()), {arguments.begin() + 1, arguments.end()}, console);
}

} // namespace

Exit run_tail(const std::vector<std::string>& arguments, const Console& console) {
    return run(tail_question, arguments, console);
}

Exit run_critical(const std::vector<std::string>& arguments, const Console& console) {
    return run(critical_question, arguments, console);
}

} // namespace rankstead::client
