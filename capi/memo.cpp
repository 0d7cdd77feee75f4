#include "memo.h"

#include <utility>

namespace rankstead {

std::shared_ptr<const Outcome> Memo::find(const std::string& key) {
    const std::lock_guard lock(mutex_);
    const auto found = by_key_.find(key);
    if (found == by_key_.end()) {
        return nullptr;
    }
    entries_.splice(entries_.begin(), entries_, found->second);
    return entries_.front().outcome;
}

void Memo::keep(std::string key, std::shared_ptr<const Outcome> outcome) {
    const std::lock_guard lock(mutex_);
    if (key.size() > most_bytes_ || by_key_.count(key) > 0) {
        return;
    }
    bytes_ += key.size();
    entries_.push_front({std::move(key), std::move(outcome)});
    by_key_.emplace(entries_.front().key, entries_.begin());
    while (entries_.size() > most_entries_ || bytes_ > most_bytes_) {
        drop_oldest();
    }
}

void Memo::drop_oldest() {
    bytes_ -= entries_.back().key.size();
    by_key_.erase(entries_.back().key);
    entries_.pop_back();
}

std::size_t Memo::entries() const {
    const std::lock_guard lock(mutex_);
    return entries_.size();
}

Memo& shared_memo() {
    constexpr std::size_t most_entries = 1000;
    constexpr std::size_t most_bytes = std::size_t{16} << 20U;
    static Memo memo(most_entries, most_bytes);
    return memo;
}

} // namespace rankstead
