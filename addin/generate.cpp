// Writes, from the catalogue of librankstead, what LibreOffice has to be told about the cell functions: the UNO
// interface (.idl), the function list with its descriptions (CalcAddIns.xcu) and the component declaration
// (rankstead.components). Runs at build time; its output is never kept under version control.
#include "functions.h"
#include "xml.h"

#include <rankstead.h>

#include <cstdlib>
#include <exception>
#include <filesystem>
#include <fstream>
#include <iostream>
#include <stdexcept>
#include <string>

namespace {

using namespace rankstead::calc;

// Files of users hold SERVICE.METHOD, so every function has to be spelt like that and belong to the one service.
void check_names() {
    for (std::size_t study = 0; study < rks_study_count(); ++study) {
        const std::string function = rks_study_function(study);
        if (service_of(study) != service_of(0) || method_of(study).empty() || method_of(study) == function)
            throw std::runtime_error("not a name of the form " + service_of(0) + ".WORD: " + function);
    }
}

void write_method(std::ostream& out, std::size_t study) {
    out << "    any " << method_of(study) << "(";
    const char* separator = "";
    for (const Parameter& parameter : parameters_of(study)) {
        out << separator << "[in] any " << parameter.name;
        separator = ", ";
    }
    out << ");\n";
}

void write_interface(std::ostream& out) {
    out << "module " << interface_module << " {\n"
        << "interface " << interface_name << " : com::sun::star::uno::XInterface {\n";
    for (std::size_t study = 0; study < rks_study_count(); ++study)
        write_method(out, study);
    out << "};\n};\n";
}

// CompatibilityName is given although it is the same: without it Excel files gain a stray defined name.
void write_function(xml::Writer& out, std::size_t study) {
    const xml::Element function(out, "node", {{"oor:name", method_of(study)}, {"oor:op", "replace"}});
    xml::property(out, "DisplayName", rks_study_function(study), xml::Language::english);
    xml::property(out, "Description", rks_study_help(study), xml::Language::english);
    xml::property(out, "Category", "Add-In", xml::Language::none);
    xml::property(out, "CompatibilityName", rks_study_function(study), xml::Language::english);
    const xml::Element list(out, "node", {{"oor:name", "Parameters"}});
    for (const Parameter& parameter : parameters_of(study)) {
        const xml::Element node(out, "node", {{"oor:name", parameter.name}, {"oor:op", "replace"}});
        xml::property(out, "DisplayName", parameter.title, xml::Language::english);
        xml::property(out, "Description", parameter.help, xml::Language::english);
    }
}

void write_function_list(std::ostream& stream) {
    xml::Writer out(stream);
    const xml::Element root(out, "oor:component-data",
                            {{"xmlns:oor", "http://openoffice.org/2001/registry"},
                             {"xmlns:xs", "http://www.w3.org/2001/XMLSchema"},
                             {"oor:name", "CalcAddIns"},
                             {"oor:package", "org.openoffice.Office"}});
    const xml::Element info(out, "node", {{"oor:name", "AddInInfo"}});
    const xml::Element service(out, "node", {{"oor:name", service_of(0)}, {"oor:op", "replace"}});
    const xml::Element functions(out, "node", {{"oor:name", "AddInFunctions"}});
    for (std::size_t study = 0; study < rks_study_count(); ++study)
        write_function(out, study);
}

void write_component(std::ostream& stream, const std::string& library) {
    xml::Writer out(stream);
    const xml::Element root(out, "components", {{"xmlns", "http://openoffice.org/2010/uno-components"}});
    const xml::Element component(
        out, "component",
        {{"loader", "com.sun.star.loader.SharedLibrary"}, {"environment", "gcc3"}, {"uri", "lib/" + library}});
    const xml::Element implementation(out, "implementation",
                                      {{"name", implementation_name}, {"constructor", "rankstead_cell_functions"}});
    xml::empty(out, "service", {{"name", service_of(0)}});
}

template <typename Write>
void write_file(const std::filesystem::path& path, Write write) {
    std::ofstream out(path, std::ios::binary);
    write(out);
    out.close();
    if (!out)
        throw std::runtime_error("cannot write " + path.string());
}

void generate(const std::filesystem::path& folder, const std::string& library) {
    check_names();
    write_file(folder / "rankstead.idl", write_interface);
    write_file(folder / "CalcAddIns.xcu", write_function_list);
    write_file(folder / "rankstead.components", [&](std::ostream& out) { write_component(out, library); });
}

} // namespace

int main(int count, char** words) try {
    if (count != 3) {
        std::cerr << "usage: generate FOLDER NAME-OF-THE-COMPONENT-LIBRARY\n";
        return EXIT_FAILURE;
    }
    generate(words[1], words[2]);
    return EXIT_SUCCESS;
} catch (const std::exception& error) {
    std::cerr << "generate: " << error.what() << '\n';
    return EXIT_FAILURE;
}
