#include "profile.h"

#include <fstream>
#include <stdexcept>

namespace calc_tests {
namespace {

// "7.4", from the line "ProductKey=LibreOffice 7.4". An office that finds another version in its profile checks its
// graphics at each start, which takes seconds.
std::string version_of(const std::filesystem::path& program_folder) {
    const std::filesystem::path file = program_folder / "bootstraprc";
    std::ifstream in(file);
    std::string line;
    while (std::getline(in, line))
        if (line.rfind("ProductKey=", 0) == 0)
            return line.substr(line.rfind(' ') + 1);
    throw std::runtime_error("no version of LibreOffice in " + file.string() + ": is it installed?");
}

void write_item(std::ostream& out, const std::string& path, const std::string& name, const std::string& value) {
    out << "<item oor:path=\"" << path << "\"><prop oor:name=\"" << name << "\" oor:op=\"fuse\"><value>" << value
        << "</value></prop></item>\n";
}

} // namespace

void write_profile(const std::filesystem::path& profile, const std::filesystem::path& program_folder,
                   const std::string& locale) {
    std::filesystem::create_directories(profile / "user");
    std::ofstream out(profile / "user" / "registrymodifications.xcu");
    out << "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n"
           "<oor:items xmlns:oor=\"http://openoffice.org/2001/registry\">\n";
    write_item(out, "/org.openoffice.Setup/Product", "ooSetupLastVersion", version_of(program_folder));
    write_item(out, "/org.openoffice.Setup/L10N", "ooSetupSystemLocale", locale);
    out << "</oor:items>\n";
    if (!out.flush())
        throw std::runtime_error("cannot write the profile " + profile.string());
}

} // namespace calc_tests
