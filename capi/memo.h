// Finished outcomes, so that a report block of fourteen cells on one table costs one analysis. Bounded in entries and
// bytes, least recently used first to go, safe for any number of threads. Keys are compared in full: two inquiries that
// share a hash never share an outcome.
#pragma once

#include "outcome.h"

#include <cstddef>
#include <list>
#include <memory>
#include <mutex>
#include <string>
#include <string_view>
#include <unordered_map>

namespace rankstead {

class Memo {
public:
    Memo(std::size_t most_entries, std::size_t most_bytes) : most_entries_(most_entries), most_bytes_(most_bytes) {}

    // Null if the key is not there.
    [[nodiscard]] std::shared_ptr<const Outcome> find(const std::string& key);
    void keep(std::string key, std::shared_ptr<const Outcome> outcome);
    [[nodiscard]] std::size_t entries() const;

private:
    struct Entry {
        std::string key;
        std::shared_ptr<const Outcome> outcome;
    };
    void drop_oldest();

    std::size_t most_entries_;
    std::size_t most_bytes_;
    std::size_t bytes_ = 0;
    mutable std::mutex mutex_;
    std::list<Entry> entries_;                                                // most recently used first
    std::unordered_map<std::string_view, std::list<Entry>::iterator> by_key_; // views of the keys in entries_
};

// The one memo of the library.
[[nodiscard]] Memo& shared_memo();

} // namespace rankstead
