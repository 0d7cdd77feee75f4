// The cell functions, as the catalogue of librankstead describes them. The generator, which declares them to Calc, and
// the component, which answers them, both read this, so that they cannot disagree.
#ifndef RANKSTEAD_ADDIN_FUNCTIONS_H
#define RANKSTEAD_ADDIN_FUNCTIONS_H

#include <cstddef>
#include <string>
#include <vector>

namespace rankstead::calc {

// The UNO interface whose methods are the cell functions, and the component that answers them.
inline constexpr char interface_module[] = "rankstead";
inline constexpr char interface_name[] = "XCellFunctions";
inline constexpr char interface_full_name[] = "rankstead.XCellFunctions";
inline constexpr char implementation_name[] = "rankstead.CellFunctions";

struct Parameter {
    std::string name;  // an identifier, e.g. "pValues"
    std::string title; // as the function wizard shows it, e.g. "p values"
    std::string help;
};

// "RKS" of "RKS.PAIRS": the UNO service. Calc stores SERVICE.METHOD in capitals inside the user's file.
std::string service_of(std::size_t study);

// "pairs" of "RKS.PAIRS": the method.
std::string method_of(std::size_t study);

// What the function takes, in order: its data, then, unless it is a helper, the answer and the settings.
std::vector<Parameter> parameters_of(std::size_t study);

} // namespace rankstead::calc

#endif
