// The border of the library: every call runs in a fixed floating-point environment, and every exception becomes a
// status, here and nowhere else.
#pragma once

#include "rankstead.h"
#include "refusal.h"

#include <cfenv>
#include <exception>
#include <new>
#include <string>

namespace rankstead {

// Rounding to nearest, subnormals kept, no traps, whatever the host has set; restored at the end.
class StandardArithmetic {
public:
    StandardArithmetic() noexcept {
        std::fegetenv(&saved_);
        std::fesetenv(FE_DFL_ENV);
    }
    ~StandardArithmetic() { std::fesetenv(&saved_); }
    StandardArithmetic(const StandardArithmetic&) = delete;
    StandardArithmetic& operator=(const StandardArithmetic&) = delete;

private:
    std::fenv_t saved_{};
};

[[nodiscard]] inline rks_status as_status(Status status) noexcept {
    return static_cast<rks_status>(status);
}

// Runs `work`, which returns a Status or throws; `report(status, refusal-or-null, words)` may keep the reason.
template <class Work, class Report>
[[nodiscard]] rks_status guarded(Work&& work, Report&& report) noexcept {
    const StandardArithmetic arithmetic;
    try {
        try {
            return as_status(work());
        } catch (const Refusal& refusal) {
            report(&refusal, refusal.message());
            return as_status(refusal.status());
        } catch (const std::bad_alloc&) {
            return as_status(Status::out_of_memory);
        } catch (const std::exception& fault) {
            report(nullptr, std::string("Rankstead itself is at fault (") + fault.what() + "). Please report it.");
            return as_status(Status::internal);
        } catch (...) {
            return as_status(Status::internal);
        }
    } catch (...) {
        return as_status(Status::out_of_memory); // no room even for the message
    }
}

// For calls that only look something up.
template <class Value, class Work>
[[nodiscard]] Value guarded_value(Value otherwise, Work&& work) noexcept {
    try {
        return work();
    } catch (...) {
        return otherwise;
    }
}

} // namespace rankstead
