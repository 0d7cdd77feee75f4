// A program started in its own process group, which never outlives its owner or its time.
#ifndef RANKSTEAD_TESTS_CALC_PROCESS_H
#define RANKSTEAD_TESTS_CALC_PROCESS_H

#include <sys/types.h>

#include <chrono>
#include <condition_variable>
#include <mutex>
#include <string>
#include <thread>
#include <vector>

namespace calc_tests {

class Process {
public:
    // Kills the whole group when `life` is over, so that nothing that waits for the program waits for ever.
    Process(const std::vector<std::string>& words, std::chrono::seconds life);
    ~Process();
    Process(const Process&) = delete;
    Process& operator=(const Process&) = delete;

    bool running();
    bool ended_within(std::chrono::seconds bound);
    int exit_status(); // -1 while it runs and when it was killed

private:
    bool reap();
    void kill_group();
    void watch(const std::stop_token& stop, std::chrono::seconds life);

    std::mutex guard; // of `ended`: a group is never signalled once its leader has been reaped
    std::condition_variable_any over;
    bool ended = false;
    int wait_status = -1;
    pid_t leader;
    std::jthread watchdog;
};

} // namespace calc_tests

#endif
