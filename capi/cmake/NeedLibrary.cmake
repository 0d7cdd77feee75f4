# Finds what a build needs and, where it is missing, says which Debian package to install.

function(rankstead_need_package package debian)
    find_package(${package} ${ARGN} QUIET)
    if(NOT ${package}_FOUND)
        message(FATAL_ERROR "The command rankstead needs ${package}, which was not found. "
            "On Debian: apt-get install ${debian}")
    endif()
endfunction()

# For a library without a CMake package: makes the imported target `target` from a header and a library file.
function(rankstead_need_library target header library debian)
    find_path(${library}_INCLUDE_DIR ${header})
    find_library(${library}_LIBRARY ${library})
    if(NOT ${library}_INCLUDE_DIR OR NOT ${library}_LIBRARY)
        message(FATAL_ERROR "The command rankstead needs ${header} and lib${library}, which were not found. "
            "On Debian: apt-get install ${debian}")
    endif()
    add_library(${target} UNKNOWN IMPORTED)
    set_target_properties(${target} PROPERTIES
        IMPORTED_LOCATION ${${library}_LIBRARY}
        INTERFACE_INCLUDE_DIRECTORIES ${${library}_INCLUDE_DIR})
endfunction()
