// Work done, as predicted seconds: counted, not clocked, so that every machine decides alike.
#pragma once

namespace rankstead {

class CountedWork {
public:
    explicit CountedWork(double seconds_allowed) : allowed_(seconds_allowed) {}

    void add(double seconds) { seconds_ += seconds; }
    [[nodiscard]] bool is_too_much() const { return seconds_ > allowed_; }

private:
    double allowed_;
    double seconds_ = 0;
};

} // namespace rankstead
