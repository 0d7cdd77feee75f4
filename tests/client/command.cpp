#include "command.h"

#include <cmath>
#include <cstdio>
#include <fcntl.h>
#include <memory>
#include <spawn.h>
#include <stdexcept>
#include <sys/wait.h>
#include <unistd.h>

namespace rankstead::client_tests {
namespace {

struct Close {
    void operator()(std::FILE* file) const { static_cast<void>(std::fclose(file)); }
};
using File = std::unique_ptr<std::FILE, Close>;

File scratch_file() {
    File file(std::tmpfile());
    if (!file) {
        throw std::runtime_error("no scratch file");
    }
    return file;
}

File file_with(const std::string& text) {
    File file = scratch_file();
    if (std::fwrite(text.data(), 1, text.size(), file.get()) != text.size()) {
        throw std::runtime_error("the scratch file is full");
    }
    std::rewind(file.get());
    return file;
}

std::string content(std::FILE* file) {
    std::rewind(file);
    std::string text;
    for (int c = std::fgetc(file); c != EOF; c = std::fgetc(file)) {
        text += static_cast<char>(c);
    }
    return text;
}

class FileActions {
public:
    FileActions() { posix_spawn_file_actions_init(&actions_); }
    ~FileActions() { posix_spawn_file_actions_destroy(&actions_); }
    FileActions(const FileActions&) = delete;
    FileActions& operator=(const FileActions&) = delete;

    void redirect(const File& file, int descriptor) {
        posix_spawn_file_actions_adddup2(&actions_, fileno(file.get()), descriptor);
    }
    void change_folder(const char* folder) { posix_spawn_file_actions_addchdir_np(&actions_, folder); }
    const posix_spawn_file_actions_t* get() const { return &actions_; }

private:
    posix_spawn_file_actions_t actions_{};
};

int run(std::vector<std::string> words, const FileActions& actions) {
    std::vector<char*> arguments;
    arguments.reserve(words.size() + 1);
    for (std::string& word : words) {
        arguments.push_back(word.data());
    }
    arguments.push_back(nullptr);
    pid_t process = 0;
    if (posix_spawn(&process, arguments[0], actions.get(), nullptr, arguments.data(), environ) != 0) {
        throw std::runtime_error("the command could not be started: " + words[0]);
    }
    int status = 0;
    waitpid(process, &status, 0);
    return WIFEXITED(status) ? WEXITSTATUS(status) : -1;
}

} // namespace

Outcome rankstead(const std::vector<std::string>& arguments, const std::string& input) {
    const File in = file_with(input), out = scratch_file(), err = scratch_file();
    FileActions actions;
    actions.redirect(in, STDIN_FILENO);
    actions.redirect(out, STDOUT_FILENO);
    actions.redirect(err, STDERR_FILENO);
    actions.change_folder(RANKSTEAD_TEST_DATA);
    std::vector<std::string> words{RANKSTEAD_COMMAND};
    words.insert(words.end(), arguments.begin(), arguments.end());
    const int status = run(std::move(words), actions);
    return {status, content(out.get()), content(err.get())};
}

double as_number(const std::string& text) {
    char* end = nullptr;
    const double number = std::strtod(text.c_str(), &end);
    return end != text.c_str() && std::string(end) == "\n" ? number : std::nan("");
}

testing::AssertionResult contains(const std::string& text, const std::string& part) {
    if (text.find(part) != std::string::npos) {
        return testing::AssertionSuccess();
    }
    return testing::AssertionFailure() << "\"" << part << "\" is not in:\n" << text;
}

testing::AssertionResult refused(const Outcome& outcome, int status, const std::vector<std::string>& parts) {
    if (outcome.status != status) {
        return testing::AssertionFailure() << "exit status " << outcome.status << ", message: " << outcome.err;
    }
    if (!outcome.out.empty()) {
        return testing::AssertionFailure() << "standard output: " << outcome.out;
    }
    if (!outcome.err.starts_with("rankstead: ") || outcome.err.find('\n') + 1 != outcome.err.size()) {
        return testing::AssertionFailure() << "not one message: " << outcome.err;
    }
    for (const std::string& part : parts) {
        if (testing::AssertionResult result = contains(outcome.err, part); !result) {
            return result;
        }
    }
    return testing::AssertionSuccess();
}

} // namespace rankstead::client_tests
