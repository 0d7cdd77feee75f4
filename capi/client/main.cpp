// The command `rankstead`.
#include "client.h"

#include <iostream>

int main(int count, char** arguments) {
    const std::vector<std::string> given(arguments + (count > 0 ? 1 : 0), arguments + count);
    return static_cast<int>(rankstead::client::run_client(given, {std::cin, std::cout, std::cerr}));
}
