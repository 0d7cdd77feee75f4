#include "studies.h"

namespace rankstead {

Outcome run_build(const Arguments& /*arguments*/, const Settings& settings) {
    Outcome outcome;
    outcome.study = StudyId::build;
    outcome.settings = settings;
    return outcome;
}

} // namespace rankstead
