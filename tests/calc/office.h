// A headless LibreOffice of its own, with a private profile and the packed extension, driven over a pipe.
// Every wait has a fixed upper bound: to start, to quit, and for everything in between.
#ifndef RANKSTEAD_TESTS_CALC_OFFICE_H
#define RANKSTEAD_TESTS_CALC_OFFICE_H

#include "document.h"
#include "process.h"

#include <com/sun/star/frame/XDesktop2.hpp>
#include <com/sun/star/uno/XComponentContext.hpp>

#include <filesystem>
#include <optional>
#include <string>

namespace calc_tests {

// A folder that is there as long as this is.
class PrivateFolder {
public:
    PrivateFolder();
    ~PrivateFolder();
    PrivateFolder(const PrivateFolder&) = delete;
    PrivateFolder& operator=(const PrivateFolder&) = delete;
    const std::filesystem::path& path() const { return folder; }

private:
    std::filesystem::path folder;
};

class Office {
public:
    explicit Office(const std::string& locale = "en-US");
    ~Office();

    Document new_document();
    Document load(const std::filesystem::path& file);

    // For files that go with the office.
    const std::filesystem::path& folder() const { return home.path(); }

    com::sun::star::uno::Reference<com::sun::star::uno::XInterface> service(const std::string& name);
    std::string part_of_zip(const std::filesystem::path& file, const std::string& part);

private:
    bool connect(const std::string& pipe);
    Document open(const std::string& url);

    PrivateFolder home;
    std::optional<Process> process;
    com::sun::star::uno::Reference<com::sun::star::uno::XComponentContext> context;
    com::sun::star::uno::Reference<com::sun::star::frame::XDesktop2> desktop;
};

} // namespace calc_tests

#endif
