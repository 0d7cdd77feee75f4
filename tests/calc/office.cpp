#include "office.h"

#include "profile.h"
#include "text.h"

#include <com/sun/star/beans/PropertyValue.hpp>
#include <com/sun/star/bridge/UnoUrlResolver.hpp>
#include <com/sun/star/connection/NoConnectException.hpp>
#include <com/sun/star/container/XNameAccess.hpp>
#include <com/sun/star/frame/Desktop.hpp>
#include <com/sun/star/io/XInputStream.hpp>
#include <com/sun/star/lang/DisposedException.hpp>
#include <com/sun/star/lang/XMultiComponentFactory.hpp>
#include <cppuhelper/bootstrap.hxx>
#include <rtl/bootstrap.hxx>

#include <cstdlib>
#include <stdexcept>
#include <unistd.h>

namespace calc_tests {

namespace uno = com::sun::star::uno;
using uno::Reference;
using uno::UNO_QUERY_THROW;

namespace {

constexpr std::chrono::seconds time_to_start(60);
constexpr std::chrono::seconds time_to_quit(20);
constexpr std::chrono::seconds time_to_live(300);
constexpr int start_me_again = 81; // what the office ends with once it has taken up extensions that are new to it
constexpr std::chrono::milliseconds pause_between_calls(50);

const std::filesystem::path program_folder = RANKSTEAD_OFFICE_PROGRAM_DIR;

std::vector<std::string> command(const std::filesystem::path& profile, const std::string& pipe) {
    return {(program_folder / "soffice.bin").string(),
            "-env:UserInstallation=" + url_of(profile),
            "-env:BUNDLED_EXTENSIONS=" + url_of(RANKSTEAD_EXTENSIONS_DIR),
            "--accept=pipe,name=" + pipe + ";urp;",
            "--headless",
            "--invisible",
            "--norestore",
            "--nologo",
            "--nodefault",
            "--nolockcheck"};
}

// Without the types of the office's own programming interface the client cannot speak to it.
Reference<uno::XComponentContext> client_context() {
    rtl::Bootstrap::set("URE_MORE_TYPES", wide(url_of(program_folder / "types" / "offapi.rdb")));
    return cppu::defaultBootstrap_InitialComponentContext();
}

uno::Sequence<com::sun::star::beans::PropertyValue> hidden() {
    uno::Sequence<com::sun::star::beans::PropertyValue> options(1);
    options.getArray()[0].Name = "Hidden";
    options.getArray()[0].Value = uno::Any(true);
    return options;
}

} // namespace

PrivateFolder::PrivateFolder() {
    std::string name = (std::filesystem::temp_directory_path() / "rankstead-calc-").string() + std::string(6, 'X');
    if (mkdtemp(name.data()) == nullptr)
        throw std::runtime_error("cannot make a folder like " + name);
    folder = name;
}

PrivateFolder::~PrivateFolder() {
    std::error_code ignored;
    std::filesystem::remove_all(folder, ignored);
}

Office::Office(const std::string& locale) {
    const std::filesystem::path profile = home.path() / "profile";
    write_profile(profile, program_folder, locale);
    const std::string pipe = home.path().filename().string();
    const std::vector<std::string> words = command(profile, pipe);
    process.emplace(words, time_to_live);
    if (!connect(pipe)) {
        process.emplace(words, time_to_live);
        if (!connect(pipe))
            throw std::runtime_error("the office ended again and again while it started");
    }
    desktop = com::sun::star::frame::Desktop::create(context);
}

// False if the office wants to be started again.
bool Office::connect(const std::string& pipe) {
    const auto resolver = com::sun::star::bridge::UnoUrlResolver::create(client_context());
    const auto deadline = std::chrono::steady_clock::now() + time_to_start;
    while (!context.is()) {
        if (process->exit_status() == start_me_again)
            return false;
        if (!process->running())
            throw std::runtime_error("the office ended while it started");
        if (std::chrono::steady_clock::now() > deadline)
            throw std::runtime_error("the office did not start in time");
        try {
            context.set(resolver->resolve(wide("uno:pipe,name=" + pipe + ";urp;StarOffice.ComponentContext")),
                        UNO_QUERY_THROW);
        } catch (const com::sun::star::connection::NoConnectException&) {
            std::this_thread::sleep_for(pause_between_calls);
        }
    }
    return true;
}

// An office that does not quit by itself is killed with the process.
Office::~Office() {
    try {
        desktop->terminate();
    } catch (const uno::Exception&) { // it is gone already, or says so in its last breath
    }
    desktop.clear();
    context.clear();
    process->ended_within(time_to_quit);
}

Document Office::open(const std::string& url) {
    return Document(desktop->loadComponentFromURL(wide(url), "_blank", 0, hidden()));
}

Document Office::new_document() {
    return open("private:factory/scalc");
}

Document Office::load(const std::filesystem::path& file) {
    return open(url_of(file));
}

Reference<uno::XInterface> Office::service(const std::string& name) {
    return context->getServiceManager()->createInstanceWithContext(wide(name), context);
}

std::string Office::part_of_zip(const std::filesystem::path& file, const std::string& part) {
    uno::Sequence<uno::Any> arguments(1);
    arguments.getArray()[0] <<= wide(url_of(file));
    const Reference<com::sun::star::container::XNameAccess> zip(
        context->getServiceManager()->createInstanceWithArgumentsAndContext("com.sun.star.packages.zip.ZipFileAccess",
                                                                            arguments, context),
        UNO_QUERY_THROW);
    const Reference<com::sun::star::io::XInputStream> stream(zip->getByName(wide(part)), UNO_QUERY_THROW);
    uno::Sequence<sal_Int8> bytes;
    std::string content;
    while (stream->readBytes(bytes, 65536) > 0)
        content.append(reinterpret_cast<const char*>(bytes.getConstArray()),
                       static_cast<std::size_t>(bytes.getLength()));
    return content;
}

} // namespace calc_tests
