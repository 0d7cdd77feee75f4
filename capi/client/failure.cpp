#include "failure.h"

namespace rankstead::client {

Exit exit_for(rks_status status) noexcept {
    switch (status) {
    case RKS_OK:
    case RKS_BLANK:
        return Exit::done;
    case RKS_OUT_OF_MEMORY:
    case RKS_INTERNAL:
        return Exit::fault;
    default:
        return status >= RKS_BAD_DATA ? Exit::data : Exit::usage;
    }
}

} // namespace rankstead::client
