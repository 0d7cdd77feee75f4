#include "client.h"

#include "catalogue.h"
#include "laws.h"
#include "reference.h"
#include "study_command.h"
#include "study_options.h"
#include "words.h"

#include <exception>
#include <new>

namespace rankstead::client {
namespace {

using Arguments = std::vector<std::string>;

Exit run_reference(const Arguments& arguments, const Console& console) {
    if (arguments == Arguments{"--help"}) {
        console.out << "Every study, answer and setting, in Markdown.\n\nUsage:\n  rankstead reference\n";
    } else if (arguments.empty()) {
        print_reference(console.out);
    } else {
        throw usage_failure("rankstead reference takes no arguments, but got " + in_quotes(arguments.front()) + '.');
    }
    return Exit::done;
}

// The sub-commands that are no studies.
struct Command {
    const char* word;
    const char* help;
    Exit (*run)(const Arguments&, const Console&);
};

constexpr Command commands[] = {
    {"reference", "Every study, answer and setting, in Markdown.", run_reference},
    {"tail", "Exact p of a published statistic, without its data.", run_tail},
    {"critical", "Statistic at which exact p reaches a level.", run_critical},
};

std::string overview() {
    std::string text = "Rank tests on the columns of a CSV file: exact p, estimate, limits, sentence.\n\nUsage:\n";
    for (const Study& study : studies()) {
        text += "  rankstead " + synopsis(study, option_names_of(study)) + "\n      " + study.help + '\n';
    }
    for (const Command& command : commands) {
        text += std::string("  rankstead ") + command.word + "\n      " + command.help + '\n';
    }
    return text + "  rankstead --version\n\nOptions of a sub-command: rankstead SUB-COMMAND --help\n\n" +
           exit_status_help() + '\n' + rks_caution_line() + '\n';
}

Failure no_such_command(const std::string& word) {
    std::vector<std::string> words;
    for (const Study& study : studies()) {
        words.push_back(hyphenated(study.word));
    }
    for (const Command& command : commands) {
        words.emplace_back(command.word);
    }
    return usage_failure("There is no sub-command " + in_quotes(word) + ". There are " + joined(words, ", ") +
                         ". See: rankstead --help");
}

Exit dispatch(const std::string& word, const Arguments& rest, const Console& console) {
    for (const Command& command : commands) {
        if (word == command.word) {
            return command.run(rest, console);
        }
    }
    if (const std::optional<Study> study = find_study(word)) {
        return run_study(*study, rest, console);
    }
    throw no_such_command(word);
}

Exit run(const Arguments& arguments, const Console& console) {
    if (arguments.empty()) {
        throw usage_failure("Say what to do, e.g. " + hyphenated(studies().front().word) + ". See: rankstead --help");
    }
    const std::string& word = arguments.front();
    if (word == "--help" || word == "-h") {
        console.out << overview();
    } else if (word == "--version") {
        console.out << rks_build() << '\n';
    } else {
        return dispatch(word, {arguments.begin() + 1, arguments.end()}, console);
    }
    return Exit::done;
}

Exit run_and_flush(const Arguments& arguments, const Console& console) {
    const Exit exit = run(arguments, console);
    if (!console.out.flush()) {
        throw Failure(Exit::fault, "The output could not be written.");
    }
    return exit;
}

Exit tell(const Console& console, const char* message, Exit exit) noexcept {
    try {
        console.out.flush();
        console.err << "rankstead: " << message << '\n';
    } catch (...) { // the streams do not throw unless they were told to
    }
    return exit;
}

} // namespace

Exit run_client(const std::vector<std::string>& arguments, const Console& console) noexcept {
    try {
        return run_and_flush(arguments, console);
    } catch (const Failure& failure) {
        return tell(console, failure.what(), failure.exit());
    } catch (const std::bad_alloc&) {
        return tell(console, "There is not enough memory.", Exit::fault);
    } catch (const std::exception& fault) {
        return tell(console, fault.what(), Exit::fault);
    } catch (...) {
        return tell(console, "An unknown fault; please report it.", Exit::fault);
    }
}

} // namespace rankstead::client
