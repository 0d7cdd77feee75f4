#include "process.h"

#include <csignal>
#include <stdexcept>
#include <sys/prctl.h>
#include <sys/wait.h>
#include <unistd.h>

namespace calc_tests {
namespace {

constexpr int not_started = 127;
constexpr std::chrono::milliseconds pause_between_looks(10);

[[noreturn]] void become(char* const* words) {
    setpgid(0, 0);
    prctl(PR_SET_PDEATHSIG, SIGKILL); // also ends with a test program that was killed
    execv(words[0], words);
    _exit(not_started);
}

pid_t start(const std::vector<std::string>& words) {
    std::vector<std::string> copies(words);
    std::vector<char*> pointers;
    for (std::string& word : copies)
        pointers.push_back(word.data());
    pointers.push_back(nullptr);
    if (access(words.at(0).c_str(), X_OK) != 0)
        throw std::runtime_error("cannot start " + words[0] + ": not there, or not a program");
    const pid_t child = fork();
    if (child == 0)
        become(pointers.data());
    if (child < 0)
        throw std::runtime_error("cannot start " + words[0] + ": no process to be had");
    setpgid(child, child);
    return child;
}

} // namespace

Process::Process(const std::vector<std::string>& words, std::chrono::seconds life)
    : leader(start(words)), watchdog([this, life](const std::stop_token& stop) { watch(stop, life); }) {}

Process::~Process() {
    watchdog.request_stop();
    kill_group();
    ended_within(std::chrono::seconds(10));
}

bool Process::running() {
    const std::lock_guard lock(guard);
    return !reap();
}

bool Process::ended_within(std::chrono::seconds bound) {
    const auto deadline = std::chrono::steady_clock::now() + bound;
    while (running()) {
        if (std::chrono::steady_clock::now() > deadline)
            return false;
        std::this_thread::sleep_for(pause_between_looks);
    }
    return true;
}

int Process::exit_status() {
    const std::lock_guard lock(guard);
    return reap() && WIFEXITED(wait_status) ? WEXITSTATUS(wait_status) : -1;
}

bool Process::reap() {
    if (!ended && waitpid(leader, &wait_status, WNOHANG) == leader)
        ended = true;
    return ended;
}

void Process::kill_group() {
    const std::lock_guard lock(guard);
    if (!reap())
        kill(-leader, SIGKILL);
}

void Process::watch(const std::stop_token& stop, std::chrono::seconds life) {
    std::unique_lock lock(guard);
    over.wait_for(lock, stop, life, [] { return false; });
    lock.unlock();
    if (!stop.stop_requested())
        kill_group();
}

} // namespace calc_tests
