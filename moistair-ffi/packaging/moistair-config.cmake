# find_package(moistair CONFIG) defines moistair::moistair (shared) and moistair::static.
get_filename_component(_moistair_prefix "${CMAKE_CURRENT_LIST_DIR}/../../.." ABSOLUTE)

if(NOT TARGET moistair::moistair)
  add_library(moistair::moistair SHARED IMPORTED)
  set_target_properties(moistair::moistair PROPERTIES
    IMPORTED_LOCATION "${_moistair_prefix}/lib/${CMAKE_SHARED_LIBRARY_PREFIX}moistair${CMAKE_SHARED_LIBRARY_SUFFIX}"
    INTERFACE_INCLUDE_DIRECTORIES "${_moistair_prefix}/include")
  add_library(moistair::static STATIC IMPORTED)
  set_target_properties(moistair::static PROPERTIES
    IMPORTED_LOCATION "${_moistair_prefix}/lib/${CMAKE_STATIC_LIBRARY_PREFIX}moistair${CMAKE_STATIC_LIBRARY_SUFFIX}"
    INTERFACE_INCLUDE_DIRECTORIES "${_moistair_prefix}/include")
endif()

unset(_moistair_prefix)
