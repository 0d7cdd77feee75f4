#include "csv_records.h"

#include "failure.h"

#include <csv.h>

#include <exception>
#include <new>

namespace rankstead::client {
namespace {

struct Collection {
    std::vector<Record> records;
    Record current;
    int last_end = 0;          // the byte that ended the last record, 0 once a field has followed
    std::exception_ptr thrown; // exceptions must not pass through the C library
};

template <class Step>
void guarded(void* data, Step step) noexcept {
    auto& collection = *static_cast<Collection*>(data);
    if (collection.thrown) {
        return;
    }
    try {
        step(collection);
    } catch (...) {
        collection.thrown = std::current_exception();
    }
}

// Reporting every line end makes empty lines visible, but also the second byte of CR LF, which is none.
void end_record(Collection& collection, int end) {
    const bool second_byte = end == '\n' && collection.last_end == '\r' && collection.current.empty();
    collection.last_end = second_byte ? 0 : end;
    if (second_byte) {
        return;
    }
    collection.records.push_back(std::move(collection.current));
    collection.current.clear();
}

extern "C" void rankstead_csv_field(void* bytes, std::size_t length, void* data) {
    guarded(data, [&](Collection& collection) {
        collection.current.emplace_back(static_cast<const char*>(bytes), length);
        collection.last_end = 0;
    });
}

extern "C" void rankstead_csv_record(int end, void* data) {
    guarded(data, [&](Collection& collection) { end_record(collection, end); });
}

class Parser {
public:
    explicit Parser(char separator) {
        if (csv_init(&parser_, CSV_STRICT | CSV_STRICT_FINI | CSV_REPALL_NL) != 0) {
            throw std::bad_alloc();
        }
        csv_set_delim(&parser_, static_cast<unsigned char>(separator));
    }
    ~Parser() { csv_free(&parser_); }
    Parser(const Parser&) = delete;
    Parser& operator=(const Parser&) = delete;

    // 0, or the error number of libcsv.
    int parse(std::string_view text, Collection& out) {
        const std::size_t done =
            csv_parse(&parser_, text.data(), text.size(), rankstead_csv_field, rankstead_csv_record, &out);
        if (done != text.size()) {
            return csv_error(&parser_);
        }
        return csv_fini(&parser_, rankstead_csv_field, rankstead_csv_record, &out) == 0 ? 0 : csv_error(&parser_);
    }

private:
    csv_parser parser_{};
};

[[noreturn]] void refuse(int error, std::size_t row, const std::string& source) {
    if (error == CSV_ENOMEM || error == CSV_ETOOBIG) {
        throw std::bad_alloc();
    }
    throw data_failure(source + ", row " + std::to_string(row) +
                       ": a quotation mark stands alone. A field in quotation marks ends with one, and one inside "
                       "such a field is written twice. If the columns are not separated by commas, say so with "
                       "--separator.");
}

} // namespace

std::vector<Record> csv_records(std::string_view text, char separator, const std::string& source) {
    Parser parser(separator);
    Collection collection;
    const int error = parser.parse(text, collection);
    if (collection.thrown) {
        std::rethrow_exception(collection.thrown);
    }
    if (error != 0) {
        refuse(error, collection.records.size() + 1, source);
    }
    return std::move(collection.records);
}

} // namespace rankstead::client
