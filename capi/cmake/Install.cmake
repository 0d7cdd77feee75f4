# Install rules of the library: the library, its header, the CMake package and the pkg-config file.

include(CMakePackageConfigHelpers)

# The package: find_package(rankstead CONFIG) gives rankstead::rankstead.
function(rankstead_install_cmake_package)
    set(folder ${CMAKE_INSTALL_LIBDIR}/cmake/rankstead)
    install(EXPORT rankstead-targets NAMESPACE rankstead:: DESTINATION ${folder})
    configure_package_config_file(cmake/rankstead-config.cmake.in rankstead-config.cmake
        INSTALL_DESTINATION ${folder})
    # Below version 1.0 a minor version may change what a major one may change later.
    write_basic_package_version_file(rankstead-config-version.cmake COMPATIBILITY SameMinorVersion)
    install(FILES
        ${CMAKE_CURRENT_BINARY_DIR}/rankstead-config.cmake
        ${CMAKE_CURRENT_BINARY_DIR}/rankstead-config-version.cmake
        DESTINATION ${folder})
endfunction()

# Paths in the pkg-config file are relative to it, so that it is right under `cmake --install --prefix` too.
function(rankstead_install_pkg_config)
    set(folder ${CMAKE_INSTALL_LIBDIR}/pkgconfig)
    file(RELATIVE_PATH RANKSTEAD_PC_PREFIX /prefix/${folder} /prefix)
    configure_file(rankstead.pc.in rankstead.pc @ONLY)
    install(FILES ${CMAKE_CURRENT_BINARY_DIR}/rankstead.pc DESTINATION ${folder})
endfunction()

function(rankstead_install_library library)
    install(TARGETS ${library} EXPORT rankstead-targets
        LIBRARY DESTINATION ${CMAKE_INSTALL_LIBDIR}
        PUBLIC_HEADER DESTINATION ${CMAKE_INSTALL_INCLUDEDIR})
    rankstead_install_cmake_package()
    rankstead_install_pkg_config()
endfunction()
